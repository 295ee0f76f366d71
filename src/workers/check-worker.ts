// Entry of the check worker.
import { createCheckDesk } from './check-desk';
import type { CheckAnswer, CheckOrder } from './live-check';
import { readTeamMesh } from './mesh-reader';

/** The scope of a dedicated worker, as far as it is used; the page's own library of types has no name for it. */
interface WorkerScope {
  onmessage: ((event: MessageEvent<CheckOrder>) => void) | null;
  readonly postMessage: (answer: CheckAnswer) => void;
}
const scope = globalThis as unknown as WorkerScope;

// a message to oneself queues up behind those of the page; a timer would be held back in a hidden tab
const turns: (() => void)[] = [];
const bell = new MessageChannel();
bell.port1.onmessage = () => turns.shift()?.();

const desk = createCheckDesk({
  answer: (answer) => scope.postMessage(answer),
  readMesh: readTeamMesh,
  defer: (task) => {
    turns.push(task);
    bell.port2.postMessage(null);
  },
  now: () => performance.now(),
  onFault: (error) => console.error(error),
});
scope.onmessage = ({ data }) => desk(data);
