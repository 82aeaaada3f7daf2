import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { type MariadbServer, startPrivateMariadb } from "#scripts/private-mariadb.ts";
import { startContainerMariadb } from "./container-mariadb.ts";

/**
 * A MariaDB for one run of tests: that of TEST_DATABASE_URL (its database name is ignored, its user must be allowed to create databases),
 * one in a container with TEST_DATABASE=container, else a private one whose data is thrown away.
 */
export async function startTestMariadb(): Promise<MariadbServer> {
  const given = process.env.TEST_DATABASE_URL;
  if (given) return { url: (database) => new URL(`/${database}`, given).href, stop: async () => {} };
  if (process.env.TEST_DATABASE === "container") return startContainerMariadb();

  const folder = await mkdtemp(path.join(tmpdir(), "rayfleck-test-"));
  const server = await startPrivateMariadb({ folder: path.join(folder, "data"), forgetful: true });
  return {
    ...server,
    async stop() {
      await server.stop();
      await rm(folder, { recursive: true, force: true });
    },
  };
}
