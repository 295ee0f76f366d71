import { notify } from '../components/toast';
import { sayProblem } from '../lib/api-problem';
import { createQueryClient } from '../lib/query-client';

/** The page's one cache. */
export const queryClient = createQueryClient((error) => notify({ text: sayProblem(error), problem: true }));
