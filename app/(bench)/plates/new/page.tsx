import { redirect } from 'next/navigation';

type Props = { searchParams: Promise<{ run?: string }> };

/** A plate is always one of a run: sends on to the page under it. */
export default async function NewPlateOfRun({ searchParams }: Props) {
  const { run } = await searchParams;
  redirect(run ? `/runs/${encodeURIComponent(run)}/plates/new` : '/runs');
}
