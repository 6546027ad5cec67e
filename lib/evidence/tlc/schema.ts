import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';

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
    .optional()
    .describe('top left, top right, bottom right, bottom left'),
  baseline: z.array(pointSchema).min(1).max(5),
  front: z.array(pointSchema).min(1).max(5),
  lanes: z.array(laneSchema).min(1, 'Mark at least one lane.').max(40),
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
  rfUncertainty: z.number().describe('standard uncertainty'),
  flags: z.array(z.string()),
});

const laneResponse = z.object({
  id: z.uuid(),
  label: z.string(),
  x: z.number().nullable(),
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
  baseline: z.array(pointSchema),
  front: z.array(pointSchema),
  lanes: z.array(laneResponse),
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
