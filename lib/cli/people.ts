import { readConfig } from "../config/environment";
import { openService } from "../service/service";
import { peopleCommand } from "./people-command";

const { code, stdout, stderr } = peopleCommand(process.argv.slice(2), () =>
  openService({ ...readConfig(process.env), log: "off" }),
);
if (stdout) console.log(stdout);
if (stderr) console.error(stderr);
process.exitCode = code;
