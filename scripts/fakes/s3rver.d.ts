declare module "s3rver" {
  /** The part of s3rver that we use; it has no types of its own. */
  export default class S3rver {
    constructor(options: {
      address: string;
      port: number;
      silent: boolean;
      directory: string;
      vhostBuckets: boolean;
      configureBuckets: { name: string; configs: string[] }[];
    });
    run(): Promise<{ port: number }>;
    close(): Promise<void>;
    httpServer: import("node:http").Server;
  }
}
