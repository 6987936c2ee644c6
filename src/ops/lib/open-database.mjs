import { checkCluster, clusterExists, initCluster, startCluster } from "./cluster.mjs";
import { placeCluster } from "./cluster-place.mjs";
import { choosePostgres, findOrInstallPostgres } from "./postgres-binaries.mjs";
import { readSecrets } from "./secrets.mjs";

/**
 * The running database server of an installation: installed, made and started as far as needed.
 *
 * Returns  `{ port, secrets, ended, dataFolder, say }`
 */
export async function openDatabase(processes, places, { say, throwAway = false }) {
  const servers = await findOrInstallPostgres(processes, { say });
  const { dataFolder, account } = await placeCluster(processes, places.cluster);
  const { bin, major } = choosePostgres(servers, dataFolder);
  const haveData = clusterExists(dataFolder);
  const secrets = readSecrets(places.home, { haveData, dataFolder });
  if (!haveData) await initCluster(processes, { bin, dataFolder, account, superuserPassword: secrets.superuserPassword });
  await checkCluster(processes, { bin, dataFolder, account });
  const { port, ended } = await startCluster(processes, { bin, dataFolder, account, throwAway });
  const where = dataFolder === places.cluster ? "" : `, data in ${dataFolder}`;
  return {
    port,
    secrets,
    ended,
    dataFolder,
    say: `PostgreSQL ${major} at 127.0.0.1:${port}${haveData ? "" : ", newly made"}${where}`,
  };
}
