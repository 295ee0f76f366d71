// All rules by the sentence that they hold.
import { clientFolders, documentWithoutReact, kitFetchesNothing } from './client-rules';
import { serverFolderNames, serverFolders } from './server-rules';
import { sameInEveryEngine, sharedDirections, sharedDoors, sharedPurity } from './shared-rules';
import type { Rule } from './walk';
import { everyImportIsKnown, noCycles, nothingSwitchedOff, sides } from './whole-rules';

export const RULES: Readonly<Record<string, Rule>> = {
  'every import can be followed': everyImportIsKnown,
  'shared folders import only what lies below them': sharedDirections,
  'a folder of shared/ is entered through its door': sharedDoors,
  'shared/ knows no clock, no chance, no browser and no Node': sharedPurity,
  'geometry and check compute the same in every engine': sameInEveryEngine,
  'server and client never import each other': sides,
  'a resource of the server is reached through its rules': serverFolders,
  'the server has the folders that the architecture names': serverFolderNames,
  'the client imports downwards, and features never meet': clientFolders,
  'the kit fetches nothing': kitFetchesNothing,
  'the open scene does not know React': documentWithoutReact,
  'no files import one another in a circle': noCycles,
  'nothing is switched off or left for later': nothingSwitchedOff,
};
