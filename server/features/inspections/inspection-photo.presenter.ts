import type { InspectionPhoto } from '#server/db/entities/inspection-photo.entity.ts';
import type { InspectionPhotoResponse } from '#shared/contracts/inspection-photo.ts';

export const presentPhoto = (photo: InspectionPhoto): InspectionPhotoResponse => ({
  id: photo.id,
  fileName: photo.fileName,
  widthPx: photo.widthPx,
  heightPx: photo.heightPx,
  addedByName: photo.addedBy?.name ?? '',
  addedAt: photo.addedAt.toISOString(),
});
