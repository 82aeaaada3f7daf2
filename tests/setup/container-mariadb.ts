import { MariaDbContainer } from "@testcontainers/mariadb";
import type { MariadbServer } from "#scripts/private-mariadb.ts";
import { WantedError } from "#scripts/run-script.ts";

/** The version of Debian 12's package. */
const image = "mariadb:10.11";

/**
 * Starts MariaDB in a container.
 *
 * @throws WantedError when no container engine runs.
 */
export async function startContainerMariadb(): Promise<MariadbServer> {
  try {
    const container = await new MariaDbContainer(image).withRootPassword("test").start();
    return {
      url: (database) => `mysql://root:test@${container.getHost()}:${container.getPort()}/${database}`,
      stop: async () => void (await container.stop()),
    };
  } catch (error) {
    throw new WantedError(`TEST_DATABASE=container needs a running container engine: ${(error as Error).message}`);
  }
}
