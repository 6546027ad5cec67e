import { findProgram, runCommand } from './commands.mjs';

/**
 * Installs a Debian package when its program is missing: as root by itself; otherwise throws with the command to type.
 * @param {string} program
 * @param {string} debianPackage
 */
async function requireProgram(program, debianPackage) {
  if (findProgram(program)) return;
  const install = `apt-get update && apt-get install -y ${debianPackage}`;
  if (process.getuid?.() !== 0 || !findProgram('apt-get')) {
    throw new Error(`${program} is missing. Install it, then run this again:\n\n  sudo sh -c '${install}'\n`);
  }
  console.log(`Installing ${debianPackage} from Debian's packages ...`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  await runCommand('apt-get', ['update'], env);
  await runCommand('apt-get', ['install', '-y', '--no-install-recommends', debianPackage], env);
  if (!findProgram(program))
    throw new Error(`${debianPackage} was installed, but ${program} is still not there.`);
}

export const requireMariadb = () => requireProgram('mariadbd', 'mariadb-server');
export const requireChromium = () => requireProgram('chromium', 'chromium');
