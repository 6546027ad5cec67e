/** Every kind of event there is, past tense, with the sentence that people read. */
export const eventTypes = {
  'laboratory.seeded': 'Demo laboratory was laid out',
  'reference.laid_down': 'Part of the reference table was laid down',
  'user.created': 'Account was made',
  'user.changed': 'Account was changed',
  'user.password_changed': 'Password was changed',
  'user.password_reset': 'Password was set anew by a mailed link',
  'user.signed_out_everywhere': 'All sign-ins of the account were ended',
  'group.created': 'Group was made',
  'membership.granted': 'Role was given',
  'membership.withdrawn': 'Role was taken away',
  'instrument.created': 'Instrument was added',
  'token.created': 'Access token was made',
  'token.revoked': 'Access token was revoked',
  'compound.created': 'Compound was added',
  'compound.changed': 'Compound was changed',
  'literature.added': 'Literature value was added',
  'literature.corrected': 'Literature value was corrected',
  'literature.preferred': 'Literature value was made the preferred one',
  'specification.written': 'Specification edition was written',
  'specification.approved': 'Specification edition was approved',
  'run.created': 'Run was started',
  'run.changed': 'Run was changed',
  'readings.added': 'Log readings were added',
  'fraction.created': 'Fraction was started',
  'fraction.changed': 'Fraction was changed',
  'fraction.submitted': 'Fraction was submitted',
  'fraction.returned': 'Fraction was returned',
  'fraction.resumed': 'Work on the returned fraction was resumed',
  'fraction.signed_off': 'Fraction was signed off',
  'fraction.reopened': 'Fraction was reopened',
  'fraction.signature_superseded': 'Signature was superseded by a change',
  'fraction.judged': 'Verdict was computed',
  'evidence.uploaded': 'Evidence file was stored',
  'evidence.attached': 'Evidence file was attached to a run',
  'tray.received': 'File came into the tray',
  'tray.filed': 'File was taken from the tray to a fraction',
  'plate.marked': 'Plate was marked',
  'plate.changed': 'Plate marks were changed',
  'trace.read': 'Trace was read from its file',
  'trace.integrated': 'Trace was integrated',
  'refractive_index.read': 'Refractive index was read',
  'share.created': 'Read-only link was made',
  'share.revoked': 'Read-only link was revoked',
} as const;

export type EventType = keyof typeof eventTypes;

/** What a command says about one change. Values are JSON; secrets never belong here. */
export type AuditEventInput = {
  type: EventType;
  recordType: string;
  recordId: string;
  groupId?: string | null;
  before?: Record<string, unknown> | null;
  after?: Record<string, unknown> | null;
  reason?: string | null;
};
