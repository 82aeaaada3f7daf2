import S3rver from "s3rver";

export interface FakeS3 {
  /** The settings that lead to it. */
  settings: Record<"S3_ENDPOINT" | "S3_BUCKET" | "S3_ACCESS_KEY_ID" | "S3_SECRET_ACCESS_KEY", string>;
  stop(): Promise<void>;
}

export interface FakeS3Options {
  /** Where files are kept. */
  folder: string;
  host?: string;
  port: number;
  /** The addresses of pages that may send files to it. */
  origins: string[];
}

const bucket = "rayfleck";

/** The only keys that s3rver knows. It checks them, except on presigned addresses, and those nothing may rely on. */
const key = "S3RVER";

/** A file store over the S3 protocol, for demonstration, development and tests. */
export async function startFakeS3({ folder, host = "127.0.0.1", port, origins }: FakeS3Options): Promise<FakeS3> {
  const server = new S3rver({
    address: host,
    port,
    silent: true,
    directory: folder,
    vhostBuckets: false,
    configureBuckets: [{ name: bucket, configs: [corsRules(origins)] }],
  });
  const listening = await server.run();
  return {
    settings: {
      S3_ENDPOINT: `http://127.0.0.1:${listening.port}`,
      S3_BUCKET: bucket,
      S3_ACCESS_KEY_ID: key,
      S3_SECRET_ACCESS_KEY: key,
    },
    async stop() {
      const closed = server.close();
      server.httpServer.closeAllConnections();
      await closed;
    },
  };
}

/** What a real bucket needs too: pages of the shop may PUT files into it. */
function corsRules(origins: string[]): string {
  const allowed = origins.map((origin) => `<AllowedOrigin>${origin}</AllowedOrigin>`).join("");
  return `<CORSConfiguration><CORSRule>${allowed}<AllowedMethod>PUT</AllowedMethod><AllowedHeader>*</AllowedHeader><MaxAgeSeconds>3000</MaxAgeSeconds></CORSRule></CORSConfiguration>`;
}
