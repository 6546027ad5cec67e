import type { PlatePhotoView, PlateView } from './schema';

/** The marks of a photo and what was read from them; what follows from these alone is left out. */
function photoFacts(photo: PlatePhotoView): Record<string, unknown> {
  const { id, evidenceId, visualiser, units, corners, baseline, front, flags, proposal } = photo;
  const lanes = photo.lanes.map(({ label, x, subject, dilutionPercent, spots }) => ({
    label,
    x,
    subject,
    dilutionPercent,
    spots: spots.map((spot) => ({
      x: spot.x,
      y: spot.y,
      rf: spot.rf,
      rfUncertainty: spot.rfUncertainty,
      flags: spot.flags,
    })),
  }));
  return { id, evidenceId, visualiser, units, corners, baseline, front, flags, lanes, proposal };
}

/** What of a plate goes into its audit event; how many proposed marks were accepted or changed stands at each photo. */
export function auditFacts(plate: PlateView): Record<string, unknown> {
  const { run, stationaryPhase, eluent, widthMm, heightMm, note, photos, methodVersion } = plate;
  return {
    run,
    stationaryPhase,
    eluent,
    widthMm,
    heightMm,
    note,
    photos: photos.map(photoFacts),
    methodVersion,
  };
}
