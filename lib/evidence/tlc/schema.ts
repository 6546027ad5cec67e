import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';
import { beforeAfter, distinctSpots, spotComparison } from './lane-answers-schema';
import { plateProposal, proposalDiff } from './proposal-schema';

const coordinate = z.number().min(-100_000).max(100_000);
export const pointSchema = z.strictObject({ x: coordinate, y: coordinate });

const codeText = z.string().trim().min(1).max(60);
const compoundText = z.string().trim().min(1).max(60).describe('id or CAS number');

export const subjectSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('fraction'), code: codeText }),
  z.strictObject({ kind: z.literal('crude') }),
  z.strictObject({ kind: z.literal('reference'), compound: compoundText.optional() }),
  z.strictObject({
    kind: z.literal('co-spot'),
    code: codeText.optional(),
    compound: compoundText.optional(),
  }),
  z.strictObject({ kind: z.literal('blank') }),
]);
export type LaneSubject = z.infer<typeof subjectSchema>;

export const spotShapes = ['spot', 'streak'] as const;

const laneSchema = z.strictObject({
  label: z.string().trim().min(1, 'Give the lane a label.').max(80),
  x: coordinate
    .optional()
    .describe('where the lane lies across the plate; needed only for a lane without spots'),
  subject: subjectSchema,
  dilutionPercent: z
    .number()
    .positive()
    .max(100)
    .nullish()
    .describe('of a reference or crude lane that was diluted: % of the undiluted sample'),
  spots: z
    .array(z.strictObject({ x: coordinate, y: coordinate, shape: z.enum(spotShapes).optional() }))
    .max(40)
    .default([]),
});

const sizeMm = z.number().positive().max(500);

export const plateMarks = {
  evidenceId: z.uuid().describe('a plate photo'),
  stationaryPhase: z.string().trim().min(1).max(160),
  eluent: z.string().trim().min(1).max(200),
  visualiser: z.string().trim().min(1).max(60).describe('an id such as uv-254, or its name'),
  widthMm: sizeMm.nullish(),
  heightMm: sizeMm.nullish(),
  note: z.string().trim().max(1000).nullish(),
  units: z
    .enum(['px', 'mm'])
    .describe('px: of the photo as shown, after its EXIF orientation, origin top left'),
  corners: z
    .array(pointSchema)
    .length(4)
    .nullish()
    .describe(
      'of the plate, in px of the photo as shown: top left, top right, bottom right, bottom left. With them marks in px are measured on the plate, free of perspective',
    ),
  baseline: z.array(pointSchema).min(1).max(5),
  front: z.array(pointSchema).min(1).max(5),
  lanes: z.array(laneSchema).min(1, 'Mark at least one lane.').max(40),
  proposal: plateProposal
    .nullish()
    .describe('the suggestion that these marks began with, as it was answered; kept with the photo'),
};

export const plateBody = z.strictObject(plateMarks);
export type PlateBody = z.infer<typeof plateBody>;
/** A change: what is left out stays as it is; lanes that are given replace all lanes. */
export const plateChange = plateBody.partial();
export type PlateChange = z.infer<typeof plateChange>;
/** The sender's side of it: what a form builds. */
export type PlateInput = z.input<typeof plateBody>;

const spotResponse = z.object({
  x: z.number(),
  y: z.number(),
  rf: z.number(),
  hRf: z.number().describe('100 Rf'),
  rfUncertainty: z.number().describe('standard uncertainty'),
  flags: z.array(z.string()),
  plateX: z.number().nullable().describe('on the plate, in its plateUnit, from the top left corner'),
  plateY: z.number().nullable(),
  projections: z
    .array(z.object({ evidenceId: z.uuid(), x: z.number(), y: z.number() }))
    .describe('where the spot lies in the other photos of the plate that have corners, px'),
});

const laneResponse = z.object({
  id: z.uuid(),
  label: z.string(),
  x: z.number().nullable(),
  plateX: z.number().nullable().describe('where it crosses the baseline, on the plate'),
  dilutionPercent: z.number().nullable(),
  subject: z.object({
    kind: z.enum(['fraction', 'crude', 'reference', 'co-spot', 'blank']),
    code: z.string().optional(),
    compound: z.object({ id: z.uuid(), name: z.string() }).optional(),
  }),
  spots: z.array(spotResponse).describe('on the photo named by evidenceId'),
});

const photoResponse = z.object({
  id: z.uuid(),
  evidenceId: z.uuid(),
  visualiser: z.string(),
  units: z.enum(['px', 'mm']),
  corners: z.array(pointSchema).nullable(),
  baseline: z.array(pointSchema),
  front: z.array(pointSchema),
  flags: z.array(z.string()),
  lanes: z.array(laneResponse),
  plateUnit: z
    .enum(['mm', 'relative'])
    .nullable()
    .describe('of plateX and plateY; relative: 1 is the whole width and height; null without corners'),
  comparisons: z.array(spotComparison).describe('spots of fraction and crude lanes against references'),
  beforeAfter: z.array(beforeAfter),
  proposal: proposalDiff
    .extend({ methodVersion: z.string().nullable() })
    .nullable()
    .describe('what became of the marks that were proposed; null where nothing was'),
});

export const plateResponse = z.object({
  id: z.uuid(),
  run: z.string(),
  stationaryPhase: z.string(),
  eluent: z.string(),
  widthMm: z.number().nullable(),
  heightMm: z.number().nullable(),
  note: z.string().nullable(),
  evidenceId: z.uuid().describe('the photo that was marked last'),
  visualiser: z.string(),
  units: z.enum(['px', 'mm']),
  corners: z.array(pointSchema).nullable(),
  baseline: z.array(pointSchema),
  front: z.array(pointSchema),
  lanes: z.array(laneResponse),
  distinctSpots: z.array(distinctSpots),
  flags: z.array(z.string()),
  photos: z.array(photoResponse).describe('one photo under each visualiser, with marks of its own'),
  methodVersion: z.string(),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  version: z.number().int(),
});
export type PlateView = z.infer<typeof plateResponse>;
export type PlatePhotoView = z.infer<typeof photoResponse>;

export const runCode = z.strictObject({ code: codeText });
export const plateId = z.strictObject({ id: z.uuid() });
export const plateListQuery = z.strictObject(pageQuery);
export const plateListResponse = z.object({
  items: z.array(plateResponse),
  nextCursor: z.string().nullable(),
});
