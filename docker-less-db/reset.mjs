import { clusterName, command } from "./arguments.mjs";
import { resetCluster } from "./cluster.mjs";

await command(async () => {
  const name = clusterName();
  await resetCluster(name);
  console.log(`Deleted the database "${name}". The next start makes a new, empty one.`);
});
