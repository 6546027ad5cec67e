import type { RouteModule } from '@/lib/openapi/build-document';
import * as health from '@/app/api/health/route';
import * as accountPassword from '@/app/api/v1/account/password/route';
import * as accountSignOutEverywhere from '@/app/api/v1/account/sign-out-everywhere/route';
import * as adminGroups from '@/app/api/v1/admin/groups/route';
import * as adminInstruments from '@/app/api/v1/admin/instruments/route';
import * as adminTokens from '@/app/api/v1/admin/tokens/route';
import * as adminTokensById from '@/app/api/v1/admin/tokens/[id]/route';
import * as adminUsers from '@/app/api/v1/admin/users/route';
import * as adminUsersById from '@/app/api/v1/admin/users/[id]/route';
import * as audit from '@/app/api/v1/audit/route';
import * as compounds from '@/app/api/v1/compounds/route';
import * as compoundsById from '@/app/api/v1/compounds/[id]/route';
import * as compoundsByIdLiterature from '@/app/api/v1/compounds/[id]/literature/route';
import * as compoundsByIdLiteratureByValueid from '@/app/api/v1/compounds/[id]/literature/[valueId]/route';
import * as compoundsByIdSpecifications from '@/app/api/v1/compounds/[id]/specifications/route';
import * as compoundsByIdStructureSvg from '@/app/api/v1/compounds/[id]/structure.svg/route';
import * as computeBoilingPoint from '@/app/api/v1/compute/boiling-point/route';
import * as computeBoilingPressure from '@/app/api/v1/compute/boiling-pressure/route';
import * as computeRefractiveIndex from '@/app/api/v1/compute/refractive-index/route';
import * as computeSeparation from '@/app/api/v1/compute/separation/route';
import * as evidence from '@/app/api/v1/evidence/route';
import * as evidenceById from '@/app/api/v1/evidence/[id]/route';
import * as evidenceByIdContent from '@/app/api/v1/evidence/[id]/content/route';
import * as evidenceByIdPlateSuggestion from '@/app/api/v1/evidence/[id]/plate-suggestion/route';
import * as evidenceByIdPreview from '@/app/api/v1/evidence/[id]/preview/route';
import * as evidenceByIdTracePreview from '@/app/api/v1/evidence/[id]/trace-preview/route';
import * as fractions from '@/app/api/v1/fractions/route';
import * as fractionsByCode from '@/app/api/v1/fractions/[code]/route';
import * as fractionsByCodeRefractiveReadings from '@/app/api/v1/fractions/[code]/refractive-readings/route';
import * as fractionsByCodeReopen from '@/app/api/v1/fractions/[code]/reopen/route';
import * as fractionsByCodeReturn from '@/app/api/v1/fractions/[code]/return/route';
import * as fractionsByCodeShares from '@/app/api/v1/fractions/[code]/shares/route';
import * as fractionsByCodeSignOff from '@/app/api/v1/fractions/[code]/sign-off/route';
import * as fractionsByCodeSubmit from '@/app/api/v1/fractions/[code]/submit/route';
import * as integrationsById from '@/app/api/v1/integrations/[id]/route';
import * as me from '@/app/api/v1/me/route';
import * as passwordResets from '@/app/api/v1/password-resets/route';
import * as passwordResetsByToken from '@/app/api/v1/password-resets/[token]/route';
import * as platesById from '@/app/api/v1/plates/[id]/route';
import * as platesByIdProfiles from '@/app/api/v1/plates/[id]/profiles/route';
import * as platesByIdRectified from '@/app/api/v1/plates/[id]/rectified/route';
import * as runs from '@/app/api/v1/runs/route';
import * as runsByCode from '@/app/api/v1/runs/[code]/route';
import * as runsByCodeFractions from '@/app/api/v1/runs/[code]/fractions/route';
import * as runsByCodePlates from '@/app/api/v1/runs/[code]/plates/route';
import * as runsByCodeReadings from '@/app/api/v1/runs/[code]/readings/route';
import * as runsCautions from '@/app/api/v1/runs/cautions/route';
import * as specificationsByIdApprove from '@/app/api/v1/specifications/[id]/approve/route';
import * as traces from '@/app/api/v1/traces/route';
import * as tracesById from '@/app/api/v1/traces/[id]/route';
import * as tracesByIdIntegrations from '@/app/api/v1/traces/[id]/integrations/route';
import * as tracesByIdPoints from '@/app/api/v1/traces/[id]/points/route';
import * as tray from '@/app/api/v1/tray/route';
import * as trayFile from '@/app/api/v1/tray/[id]/file/route';

/** Every route of the API by its path; a test compares this list with the files. */
export const documentedRoutes: Record<string, RouteModule> = {
  '/api/health': health,
  '/api/v1/account/password': accountPassword,
  '/api/v1/account/sign-out-everywhere': accountSignOutEverywhere,
  '/api/v1/admin/groups': adminGroups,
  '/api/v1/admin/instruments': adminInstruments,
  '/api/v1/admin/tokens': adminTokens,
  '/api/v1/admin/tokens/{id}': adminTokensById,
  '/api/v1/admin/users': adminUsers,
  '/api/v1/admin/users/{id}': adminUsersById,
  '/api/v1/audit': audit,
  '/api/v1/compounds': compounds,
  '/api/v1/compounds/{id}': compoundsById,
  '/api/v1/compounds/{id}/literature': compoundsByIdLiterature,
  '/api/v1/compounds/{id}/literature/{valueId}': compoundsByIdLiteratureByValueid,
  '/api/v1/compounds/{id}/specifications': compoundsByIdSpecifications,
  '/api/v1/compounds/{id}/structure.svg': compoundsByIdStructureSvg,
  '/api/v1/compute/boiling-point': computeBoilingPoint,
  '/api/v1/compute/boiling-pressure': computeBoilingPressure,
  '/api/v1/compute/refractive-index': computeRefractiveIndex,
  '/api/v1/compute/separation': computeSeparation,
  '/api/v1/evidence': evidence,
  '/api/v1/evidence/{id}': evidenceById,
  '/api/v1/evidence/{id}/content': evidenceByIdContent,
  '/api/v1/evidence/{id}/plate-suggestion': evidenceByIdPlateSuggestion,
  '/api/v1/evidence/{id}/preview': evidenceByIdPreview,
  '/api/v1/evidence/{id}/trace-preview': evidenceByIdTracePreview,
  '/api/v1/fractions': fractions,
  '/api/v1/fractions/{code}': fractionsByCode,
  '/api/v1/fractions/{code}/refractive-readings': fractionsByCodeRefractiveReadings,
  '/api/v1/fractions/{code}/reopen': fractionsByCodeReopen,
  '/api/v1/fractions/{code}/return': fractionsByCodeReturn,
  '/api/v1/fractions/{code}/shares': fractionsByCodeShares,
  '/api/v1/fractions/{code}/sign-off': fractionsByCodeSignOff,
  '/api/v1/fractions/{code}/submit': fractionsByCodeSubmit,
  '/api/v1/integrations/{id}': integrationsById,
  '/api/v1/me': me,
  '/api/v1/password-resets': passwordResets,
  '/api/v1/password-resets/{token}': passwordResetsByToken,
  '/api/v1/plates/{id}': platesById,
  '/api/v1/plates/{id}/profiles': platesByIdProfiles,
  '/api/v1/plates/{id}/rectified': platesByIdRectified,
  '/api/v1/runs': runs,
  '/api/v1/runs/{code}': runsByCode,
  '/api/v1/runs/{code}/fractions': runsByCodeFractions,
  '/api/v1/runs/{code}/plates': runsByCodePlates,
  '/api/v1/runs/{code}/readings': runsByCodeReadings,
  '/api/v1/runs/cautions': runsCautions,
  '/api/v1/specifications/{id}/approve': specificationsByIdApprove,
  '/api/v1/traces': traces,
  '/api/v1/traces/{id}': tracesById,
  '/api/v1/traces/{id}/integrations': tracesByIdIntegrations,
  '/api/v1/traces/{id}/points': tracesByIdPoints,
  '/api/v1/tray': tray,
  '/api/v1/tray/{id}/file': trayFile,
};
