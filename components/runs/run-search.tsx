import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';

/** Finds runs by a part of the code, target, source or lot. A plain form: the address holds the question. */
export function RunSearch({ q }: { q: string }) {
  return (
    <form action="/runs" role="search" className="mb-5 flex flex-wrap items-end gap-2">
      <Field
        className="w-full max-w-form"
        label="Find a run"
        hint="Part of a code, target, source or lot"
        type="search"
        name="q"
        defaultValue={q}
      />
      <Button type="submit" className="mb-6">
        Find
      </Button>
    </form>
  );
}
