import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { StateMark } from '@/components/states/state-mark';
import { Button } from './button';
import { DataTable } from './data-table';
import { NumberField } from './number-field';

/** The texts of the elements that an element points to by aria-describedby. */
function describedBy(markup: string, tag: string): string[] {
  const ids = new RegExp(`<${tag}[^>]*aria-describedby="([^"]+)"`).exec(markup)?.[1]?.split(' ') ?? [];
  return ids.map(
    (id) => new RegExp(`id="${id}"[^>]*>([^<]*)<`).exec(markup)?.[1] ?? `nothing has the id ${id}`,
  );
}

describe('a button that may not be used', () => {
  const markup = renderToStaticMarkup(
    <Button disabledReason="You collected this fraction.">Sign off</Button>,
  );

  it('stays reachable by keyboard and says why', () => {
    expect(markup).not.toMatch(/<button[^>]*\sdisabled/);
    expect(markup).toMatch(/<button[^>]*aria-disabled="true"/);
    expect(describedBy(markup, 'button')).toEqual(['You collected this fraction.']);
  });
});

describe('a number field', () => {
  const markup = renderToStaticMarkup(
    <NumberField label="Tare" unit="g" hint="Empty and dry" error="Write a number, such as 24.31." />,
  );

  it('is read out with its unit, its hint and its error', () => {
    expect(describedBy(markup, 'input')).toEqual(['g', 'Empty and dry', 'Write a number, such as 24.31.']);
    expect(markup).toMatch(/<input[^>]*aria-invalid="true"/);
  });

  it('is labelled, and does not let the browser reformat what was typed', () => {
    const id = /<label for="([^"]+)"/.exec(markup)?.[1];
    expect(id).toBeTruthy();
    expect(markup).toMatch(new RegExp(`<input[^>]*id="${id}"`));
    expect(markup).toMatch(/<input[^>]*type="text"/);
  });
});

describe('a state mark', () => {
  it('always has its word, also when only the mark is seen', () => {
    expect(renderToStaticMarkup(<StateMark state="signed_off" />)).toContain('signed off');
    expect(renderToStaticMarkup(<StateMark state="blind" wordHidden />)).toContain(
      '<span class="sr-only">blind</span>',
    );
  });

  it('refuses a state that has no mark', () => {
    expect(() => renderToStaticMarkup(<StateMark state="released" />)).toThrow(/marks\.ts/);
  });
});

describe('a data table', () => {
  const columns = [
    { key: 'code', header: 'Fraction', rowHeader: true, cell: (row: string) => row },
    { key: 'length', header: 'Length', numeric: true, cell: (row: string) => row.length },
  ];

  it('has a caption, column headers and a header in each row', () => {
    const markup = renderToStaticMarkup(
      <DataTable caption="Fractions" columns={columns} rows={['F1', 'F2']} rowKey={(row) => row} />,
    );
    expect(markup).toContain('Fractions</caption>');
    expect(markup.match(/scope="col"/g)).toHaveLength(2);
    expect(markup.match(/scope="row"/g)).toHaveLength(2);
  });

  it('gives way to the empty state when it has no rows', () => {
    const empty = <p>Start a run.</p>;
    expect(
      renderToStaticMarkup(
        <DataTable caption="x" columns={columns} rows={[]} rowKey={(row) => row} empty={empty} />,
      ),
    ).toBe('<p>Start a run.</p>');
  });
});
