import { listSpecifications } from '@/lib/acceptance/list-specifications';
import {
  newSpecificationSchema,
  specificationListQuery,
  specificationPageSchema,
  specificationSchema,
} from '@/lib/acceptance/specification-schema';
import { writeSpecification } from '@/lib/acceptance/write-specification';
import { compoundParams } from '@/lib/compounds/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Editions of the specification of a compound in the groups of the caller, the newest first',
  params: compoundParams,
  query: specificationListQuery,
  response: specificationPageSchema,
  handle: async ({ actor, params, query }) => ({ json: await listSpecifications(actor, params.id, query) }),
});

export const POST = route({
  summary: 'Write a new edition; older ones stay as they are',
  params: compoundParams,
  body: newSpecificationSchema,
  response: specificationSchema,
  status: 201,
  handle: async ({ actor, params, body }) => ({ json: await writeSpecification(actor, params.id, body) }),
});
