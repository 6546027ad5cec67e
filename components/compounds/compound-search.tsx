import { Field } from '@/components/ui/field';
import { Button } from '@/components/ui/button';

/** One box for every way to name a compound. A plain form: the search stands in the address. */
export function CompoundSearch({ q }: { q: string }) {
  return (
    <form action="/compounds" role="search" className="mb-5 flex max-w-2xl flex-wrap items-end gap-3">
      <Field
        className="min-w-0 flex-1 basis-64"
        label="Find a compound"
        hint="Name, synonym, CAS number, formula or InChIKey"
        name="q"
        type="search"
        defaultValue={q}
        autoComplete="off"
        spellCheck={false}
        maxLength={200}
      />
      <Button type="submit" className="mb-[22px]">
        Search
      </Button>
    </form>
  );
}
