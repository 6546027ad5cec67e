import { redirect } from 'next/navigation';

/** The bench has one address. */
export default function RootPage() {
  redirect('/bench');
}
