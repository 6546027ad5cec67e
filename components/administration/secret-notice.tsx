'use client';
import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { CopyButton } from '@/components/ui/copy-button';
import { Notice } from '@/components/ui/notice';

type Props = { title: string; secret: string; children: ReactNode; onClose: () => void };

/** Shows a secret once. When it is closed nobody can see it again, the server included. */
export function SecretNotice({ title, secret, children, onClose }: Props) {
  return (
    <div className="mb-4">
      <Notice
        kind="needs you"
        live
        title={title}
        action={
          <div className="flex flex-wrap gap-2">
            <CopyButton text={secret} />
            <Button onClick={onClose}>I have kept it</Button>
          </div>
        }
      >
        <p className="my-2 font-mono break-all select-all" data-testid="secret">
          {secret}
        </p>
        {children}
      </Notice>
    </div>
  );
}
