import { redirect } from 'next/navigation';

/** The front door leads to the bench; without a session the bench leads to sign-in. */
export default function FrontDoor(): never {
  redirect('/bench');
}
