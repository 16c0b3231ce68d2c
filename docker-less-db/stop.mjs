import { clusterName, command } from "./arguments.mjs";
import { stopCluster } from "./cluster.mjs";

await command(async () => {
  const name = clusterName();
  const wasRunning = await stopCluster(name);
  console.log(wasRunning ? `Stopped the database "${name}".` : `The database "${name}" was not running.`);
});
