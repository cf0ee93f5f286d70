/** A file that goes with a mail, in object storage. */
export interface MailAttachment {
  fileName: string;
  mediaType: string;
  storageKey: string;
  bytes: number;
}
