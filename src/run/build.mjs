// `npm run build`: the build `npm start` would make, into OUT_DIR.
import { checkNode, ensureBuild, ensurePackages } from "./prepare.mjs";

try {
  checkNode();
  await ensurePackages();
  await ensureBuild(process.env.OUT_DIR || "dist");
} catch (error) {
  console.error(error.message);
  process.exitCode = 1;
}
