import { StateMark } from '@/components/states/state-mark';
import { DefinitionList } from '@/components/ui/definition-list';
import { Notice } from '@/components/ui/notice';
import type { MassBalance } from '@/lib/distillation/mass-balance';
import { formatMass } from '@/lib/units/mass';

const advice: Record<MassBalance['flags'][number], string> = {
  'recovery over 100 %':
    'More was weighed than was put in: check tares, the charge and whether a receiver was wet.',
  'no residue weighed': 'The residue is not weighed yet: weigh it when the run ends.',
  'no trap weighed': 'The cold trap is not weighed yet: file it as a fraction of the cut “trap”.',
  'fractions without a mass': 'A receiver is not weighed yet: enter tare and gross.',
};

/** What was put in and what came out, with what is still missing. */
export function MassBalanceView({ balance, chargeMassG }: { balance: MassBalance; chargeMassG: number }) {
  const percent = (100 * balance.recovery).toFixed(1);
  return (
    <div className="flex flex-col gap-4">
      <DefinitionList
        columns={3}
        items={[
          { term: 'Charge', value: formatMass(chargeMassG) },
          {
            term: 'Weighed again',
            value: formatMass(balance.recoveredMassG),
            condition: `${percent} % of the charge, u = ${(100 * balance.recoveryUncertainty).toFixed(2)} % (k = 1)`,
          },
          {
            term: 'Not accounted for',
            value: formatMass(balance.lossMassG),
            condition: `${balance.lossPercent.toFixed(1)} %`.replace('-', '\u2212'),
          },
        ]}
      />
      {balance.flags.map((flag) =>
        flag === 'recovery over 100 %' ? (
          <Notice key={flag} kind="fails" title="Recovery over 100 %">
            {advice[flag]}
          </Notice>
        ) : (
          <p key={flag} className="flex flex-wrap items-center gap-2">
            <StateMark state="missing" />
            {advice[flag]}
          </p>
        ),
      )}
    </div>
  );
}
