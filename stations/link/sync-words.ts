/** The n-th request to synchronise with, and what answers it. Neighbouring requests must have different answers. */
export type SyncWords = (n: number) => { message: string; isAnswer: (line: string) => boolean };
