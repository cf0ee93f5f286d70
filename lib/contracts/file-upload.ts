import { z } from 'zod';
import { fileKinds } from './stored-states';

export const fileUploadSchema = z.object({
  kind: z.enum(fileKinds, { error: 'Say what the file is for.' }),
  name: z
    .string()
    .trim()
    .min(1, { error: 'The file has no name.' })
    .max(200, { error: 'Shorten the name of the file.' }),
});
export type FileUpload = z.infer<typeof fileUploadSchema>;

/** What a page needs of a stored file. Pixels; null: not a picture. */
export interface FileFacts {
  id: string;
  name: string;
  mediaType: string;
  bytes: number;
  width: number | null;
  height: number | null;
}
