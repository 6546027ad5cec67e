'use client';

import { useRouter } from 'next/navigation';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';

/** Takes a verification code as it is printed, with or without its dashes. */
export function VerifyForm() {
  const router = useRouter();
  const [code, setCode] = useState('');
  const [tried, setTried] = useState(false);
  function check(event: FormEvent) {
    event.preventDefault();
    setTried(true);
    if (code.trim()) router.push(`/verify/${encodeURIComponent(code.trim())}`);
  }
  return (
    <form onSubmit={check} className="flex flex-col gap-4">
      <Field
        label="Verification code"
        hint="Twelve letters and digits, such as 7K2M-9QXT-04HB. It stands beside the signature."
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        value={code}
        onChange={(event) => setCode(event.target.value)}
        error={tried && !code.trim() ? 'Type the code from the certificate.' : null}
      />
      <Button type="submit" variant="primary">
        Check
      </Button>
    </form>
  );
}
