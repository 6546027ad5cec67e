import type { ReactNode } from 'react';

export type NoticeKind = 'info' | 'needs you' | 'fails';

const KIND: Record<NoticeKind, { edge: string; word: string; text: string; mark: ReactNode }> = {
  info: {
    edge: 'border-glass bg-glass-wash',
    word: 'For your information',
    text: 'text-glass',
    mark: <path d="M3 3.5h12M3 8.5h12M3 13.5h7" />,
  },
  'needs you': {
    edge: 'border-needs bg-needs-wash',
    word: 'Needs you',
    text: 'text-needs',
    mark: <path d="M9 2v9.5M4.5 7.5 9 12l4.5-4.5M3 16h12" />,
  },
  fails: {
    edge: 'border-fails bg-fails-wash',
    word: 'Fails',
    text: 'text-fails',
    mark: <path d="m4 4 10 10M14 4 4 14" />,
  },
};

type NoticeProps = {
  kind?: NoticeKind;
  title?: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
  /** Read out at once when it appears after the page has loaded. */
  live?: boolean;
};

/** Something to know, to do, or that went wrong. The kind is said by its own mark and word, not only by its colour. */
export function Notice({ kind = 'info', title, children, action, live = false }: NoticeProps) {
  const { edge, word, text, mark } = KIND[kind];
  return (
    <div
      role={live ? (kind === 'info' ? 'status' : 'alert') : 'note'}
      className={`flex gap-3 rounded border-l-4 px-4 py-3 ${edge}`}
    >
      <svg
        width="18"
        height="18"
        viewBox="0 0 18 18"
        aria-hidden="true"
        className={`mt-0.5 shrink-0 ${text}`}
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinecap="round"
        strokeLinejoin="round"
      >
        {mark}
      </svg>
      <div className="min-w-0 flex-1">
        <p className={`font-bold ${text}`}>
          {title ? <span className="sr-only">{`${word}: `}</span> : word}
          {title}
        </p>
        {children ? <div className="max-w-prose">{children}</div> : null}
        {action ? <div className="mt-2">{action}</div> : null}
      </div>
    </div>
  );
}
