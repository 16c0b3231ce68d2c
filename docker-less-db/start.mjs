import { clusterName, command } from "./arguments.mjs";
import { startCluster } from "./cluster.mjs";

await command(async () => {
  const name = clusterName();
  const { url } = await startCluster(name, { keep: true });
  console.log(url);
});
