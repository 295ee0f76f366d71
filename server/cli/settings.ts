// `node dist/server/settings.js`: reads the settings as the server would, and says which one is wrong.
import { ConfigFault, readConfig } from '../config';

try {
  readConfig(process.env);
} catch (error) {
  if (!(error instanceof ConfigFault)) throw error;
  process.stderr.write(`${error.message}\n`);
  process.exitCode = 1;
}
