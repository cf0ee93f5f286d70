declare module 's3rver' {
  import type { Server } from 'node:http';

  export default class S3rver {
    constructor(options: {
      address: string;
      port: number;
      silent: boolean;
      directory: string;
      configureBuckets: { name: string }[];
    });
    httpServer: Server;
    run(): Promise<{ port: number }>;
    close(): Promise<void>;
  }
}
