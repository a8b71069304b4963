/** `npm run build`: builds the pages, whether or not their sources changed. */
import { SetupError, build, checkNode, ensureInstalled } from "./setup.mjs";

try {
  checkNode();
  ensureInstalled();
  build();
} catch (error) {
  console.error(error instanceof SetupError ? error.message : error);
  process.exit(1);
}
