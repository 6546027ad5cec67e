'use client';
import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/button';

/** For a page that could not be shown: says what is safe and what to do next. The digest finds the entry in the log. */
export default function PageError({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  const router = useRouter();
  return (
    <div role="alert" className="mx-auto max-w-form px-4 py-12">
      <h1 className="text-xl">This page could not be shown</h1>
      <p className="mt-2 text-ink-soft">
        What was saved before is kept; what was being typed here may not have been sent. Try again. If it
        happens twice, tell your administrator
        {error.digest ? (
          <>
            {' '}
            the mark <code className="font-mono text-ink">{error.digest}</code>, which finds the entry in the
            log.
          </>
        ) : (
          ' the time and the address of this page.'
        )}
      </p>
      <div className="mt-5 flex flex-wrap gap-2">
        <Button variant="primary" onClick={reset}>
          Try again
        </Button>
        <Button variant="quiet" onClick={() => router.push('/bench')}>
          To the bench
        </Button>
      </div>
    </div>
  );
}
