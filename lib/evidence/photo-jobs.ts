import sharp from 'sharp';
import { heicToJpeg } from './decode-heic';
import { profilePhoto, type ProfiledLane, type ProfileMarks } from './tlc/profile-photo';
import { warpPlate, type WarpRequest } from './tlc/warp-plate';

/** Work on pixels that is too long for the thread that answers requests. */
export type PhotoJob =
  | { kind: 'heic to jpeg'; bytes: Uint8Array }
  | { kind: 'warp'; bytes: Uint8Array; request: WarpRequest }
  | { kind: 'profiles'; bytes: Uint8Array; marks: ProfileMarks };

export type PhotoJobResult = {
  'heic to jpeg': { jpeg: Uint8Array; width: number; height: number };
  warp: { webp: Uint8Array };
  profiles: { lanes: (ProfiledLane | null)[] };
};

/** Does one job; runs inside the worker thread. Throws what the decoders throw. */
export async function doPhotoJob(job: PhotoJob): Promise<PhotoJobResult[PhotoJob['kind']]> {
  const bytes = Buffer.from(job.bytes);
  switch (job.kind) {
    case 'heic to jpeg':
      return heicToJpeg(bytes, (data, width, height) => sharp(data, { raw: { width, height, channels: 4 } }));
    case 'warp':
      return { webp: await warpPlate(bytes, job.request) };
    case 'profiles':
      return { lanes: await profilePhoto(bytes, job.marks) };
  }
}
