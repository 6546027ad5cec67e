import Link from 'next/link';
import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { buttonClass, type ButtonVariant } from '@/components/ui/button-class';

type ActionLinkProps = { href: string; reason: string | null; variant?: ButtonVariant; children: ReactNode };

/** A link that looks like a button; where it may not be used it stays in sight and says why. */
export function ActionLink({ href, reason, variant = 'secondary', children }: ActionLinkProps) {
  if (reason) {
    return (
      <Button variant={variant} disabledReason={reason}>
        {children}
      </Button>
    );
  }
  return (
    <Link href={href} className={buttonClass(variant)}>
      {children}
    </Link>
  );
}
