export interface SyncRequest {
  message: string;
  isAnswer: (line: string) => boolean;
  /** Whether a line that comes while `asked` waits for its answer could be this request's, however late. */
  couldBeLate?: (line: string, asked: string) => boolean;
}

/** The n-th request to synchronise with, and what answers it. Neighbouring requests must have different answers. */
export type SyncWords = (n: number) => SyncRequest;
