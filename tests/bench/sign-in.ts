/** Signs in at the running app as a program does; the session as the value of a Cookie header. */
export async function signIn(url: string, person: { email: string; plainPassword: string }): Promise<string> {
  const jar = new Map<string, string>();
  const keep = (response: Response) => {
    for (const line of response.headers.getSetCookie()) {
      const [pair] = line.split(';');
      const at = pair!.indexOf('=');
      jar.set(pair!.slice(0, at), pair!.slice(at + 1));
    }
    return response;
  };
  const cookie = () => [...jar].map(([name, value]) => `${name}=${value}`).join('; ');
  const { csrfToken } = (await keep(await fetch(`${url}/api/auth/csrf`)).json()) as { csrfToken: string };
  const form = { email: person.email, password: person.plainPassword, csrfToken, json: 'true' };
  const answer = await fetch(`${url}/api/auth/callback/credentials`, {
    method: 'POST',
    headers: { origin: url, cookie: cookie() },
    body: new URLSearchParams(form),
    redirect: 'manual',
  });
  await keep(answer).arrayBuffer();
  if (![...jar.keys()].some((name) => name.includes('session-token')))
    throw new Error(`Signing in at ${url} gave no session (status ${answer.status}).`);
  return cookie();
}
