import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { environmentKeys } from '@/lib/env';

describe('.env.example', () => {
  it('names each key that the application reads, each with a sentence, and no other', () => {
    const lines = readFileSync('.env.example', 'utf8').split('\n');
    const keys = lines.flatMap((line) => /^#? ?([A-Z][A-Z0-9_]+)=/.exec(line)?.[1] ?? []);
    expect([...keys].sort()).toEqual(environmentKeys.filter((key) => key !== 'NODE_ENV').sort());
    lines.forEach((line, index) => {
      if (/^#? ?[A-Z][A-Z0-9_]+=/.test(line))
        expect(lines[index - 1], `a sentence above ${line}`).toMatch(/^# \S+ \S+/);
    });
  });
});
