import type { z } from 'zod';
import type { revision } from '#shared/api';

export type Revision = z.infer<typeof revision>;
