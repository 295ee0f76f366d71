// Every key of the bench, in one table: what it does, and how the sheet of keys says it.
import type { Triple } from '../viewport/vectors';
import { pictureAxes } from '../viewport/view';
import type { Bench } from '../bench-model';
import { closeFinding, openFinding } from '../open-finding';
import { findingKey } from '../../../lib/finding-words';
import { clamp, duplicate, nudge, partGroup, remove, sayRemoved, selectionNow, turnBy } from '../part-deeds';
import { STANDPOINTS } from '../standpoints/standpoints';
import { TURN_STEP } from '../steps';
import { pairRungs } from '../ladder/rungs';
import { sceneBox } from '../viewport/extent';

export interface KeyContext extends Bench {
  /** Step of a nudge, mm. */
  readonly step: number;
  /** Said to readers of the screen and shown for a moment. */
  readonly say: (text: string, undo?: () => void) => void;
}

export interface KeyDeed {
  /** As `event.key` gives them, with Ctrl+ and Shift+ before. Ctrl stands for Command on a Mac, too. */
  readonly keys: readonly string[];
  readonly shown: string;
  readonly what: string;
  readonly section: 'Looking' | 'Selecting' | 'Moving' | 'Findings' | 'The rest';
  /** Only for those who may change the scene. */
  readonly edits?: true;
  readonly run: (context: KeyContext, key: string) => void;
}

const TURN_BY = 12;
const PAN_BY = 60;

/** The axis of the car that lies nearest to a direction of the picture. */
function nearestAxis(direction: Triple, among: readonly (0 | 1 | 2)[]): Triple {
  const axis = among.reduce((best, k) => (Math.abs(direction[k]) > Math.abs(direction[best]) ? k : best));
  const out: [number, number, number] = [0, 0, 0];
  out[axis] = direction[axis] < 0 ? -1 : 1;
  return out;
}

/**
 * Where an arrow key moves to: as it looks on the screen. Level for someone who stands there; in the sheet's plane for a
 * square-on look; Page Up and Page Down take the third way.
 */
export function nudgeDirection(context: Pick<Bench, 'view'>, key: string): Triple | null {
  const view = context.view.hand()?.view() ?? { around: 180, above: 30, isSquare: false };
  const { right, up } = pictureAxes(view);
  const isElevation = view.isSquare && view.above < 45;
  const across = nearestAxis(right, [0, 1]);
  const isAlong = across[0] !== 0;
  const inward: Triple = nearestAxis(
    [-Math.cos((view.around * Math.PI) / 180), -Math.sin((view.around * Math.PI) / 180), 0],
    [isAlong ? 1 : 0],
  );
  const upward: Triple = isElevation ? [0, 0, 1] : view.above > 60 ? nearestAxis(up, [isAlong ? 1 : 0]) : inward;
  const third: Triple = isElevation ? inward : [0, 0, 1];
  const flip = (v: Triple): Triple => [-v[0] + 0, -v[1] + 0, -v[2] + 0];
  switch (key) {
    case 'ArrowRight':
      return across;
    case 'ArrowLeft':
      return flip(across);
    case 'ArrowUp':
      return upward;
    case 'ArrowDown':
      return flip(upward);
    case 'PageUp':
      return third;
    case 'PageDown':
      return flip(third);
    default:
      return null;
  }
}

function arrow(context: KeyContext, key: string, times: number): void {
  const hand = context.view.hand();
  if (selectionNow(context).ids.length === 0 || !context.open.getState().canEdit) {
    const [x, y] = [
      Number(key === 'ArrowRight') - Number(key === 'ArrowLeft'),
      Number(key === 'ArrowUp') - Number(key === 'ArrowDown'),
    ];
    if (hand?.view().isSquare === true) hand.pan(x * PAN_BY, y * PAN_BY);
    else hand?.turn(x * TURN_BY, y * TURN_BY);
    return;
  }
  const direction = nudgeDirection(context, key);
  if (direction === null) return;
  const mm = context.step * times;
  nudge(context, [direction[0] * mm, direction[1] * mm, direction[2] * mm]);
}

function fit(context: KeyContext, onlySelected: boolean): void {
  const { moving } = selectionNow(context);
  const { scene } = context.open.getState();
  const box = sceneBox(scene, context.meshes, onlySelected && moving.size > 0 ? moving : undefined);
  if (box !== null) context.view.hand()?.fit(box);
}

function stepFinding(context: KeyContext, by: number): void {
  const rungs = pairRungs(context.live.getState().findings).filter((r) => r.finding.verdict !== 'seated');
  if (rungs.length === 0) return;
  const open = context.session.getState().finding;
  const at = rungs.findIndex((r) => findingKey(r.finding) === open);
  const next = rungs[at < 0 ? 0 : (at + by + rungs.length) % rungs.length]!;
  openFinding(context, next.finding);
}

function togglePresence(context: KeyContext, presence: 'faded' | 'off'): void {
  const { moving } = selectionNow(context);
  const { presence: now, setPresence } = context.session.getState();
  const ids = [...moving];
  setPresence(ids, ids.every((id) => now[id] === presence) ? null : presence);
}

export const KEYS: readonly KeyDeed[] = [
  {
    keys: STANDPOINTS.map((_, i) => String(i + 1)),
    shown: '1 \u2013 9',
    what: 'stand at a standpoint',
    section: 'Looking',
    run: ({ view }, key) => view.hand()?.standAt(STANDPOINTS[Number(key) - 1]!),
  },
  { keys: ['a'], shown: 'A', what: 'fit all', section: 'Looking', run: (c) => fit(c, false) },
  { keys: ['f'], shown: 'F', what: 'fit what is selected', section: 'Looking', run: (c) => fit(c, true) },
  { keys: ['+', '='], shown: '+', what: 'nearer', section: 'Looking', run: ({ view }) => view.hand()?.zoom(1 / 1.2) },
  { keys: ['-'], shown: '\u2212', what: 'farther', section: 'Looking', run: ({ view }) => view.hand()?.zoom(1.2) },
  {
    keys: ['Alt+ArrowLeft', 'Alt+ArrowRight', 'Alt+ArrowUp', 'Alt+ArrowDown'],
    shown: 'Alt + arrows',
    what: 'walk around (arrows alone, with nothing selected)',
    section: 'Looking',
    run: ({ view }, key) => {
      const x = Number(key === 'ArrowRight') - Number(key === 'ArrowLeft');
      const y = Number(key === 'ArrowUp') - Number(key === 'ArrowDown');
      view.hand()?.turn(x * TURN_BY, y * TURN_BY);
    },
  },
  {
    keys: ['l'],
    shown: 'L',
    what: 'lasers on or off',
    section: 'Looking',
    run: ({ session }) => session.getState().set({ showsLasers: !session.getState().showsLasers }),
  },
  {
    keys: ['Shift+L'],
    shown: 'Shift + L',
    what: 'where the lasers are thrown',
    section: 'Looking',
    run: ({ session }) => session.getState().set({ sheet: 'lasers' }),
  },
  {
    keys: ['c'],
    shown: 'C',
    what: 'hang a cutaway, or take it down',
    section: 'Looking',
    run: ({ session }) => {
      const { cutOn, set } = session.getState();
      set({ cutOn: cutOn === null ? { datum: null, axis: 1, offset: 0, isFlipped: false } : null });
    },
  },
  {
    keys: ['h'],
    shown: 'H',
    what: 'fade, or bring back',
    section: 'Selecting',
    run: (c) => togglePresence(c, 'faded'),
  },
  {
    keys: ['Shift+H'],
    shown: 'Shift + H',
    what: 'take off the bench, or put back',
    section: 'Selecting',
    run: (c) => togglePresence(c, 'off'),
  },
  {
    keys: ['u'],
    shown: 'U',
    what: 'bring everything back on the bench',
    section: 'Selecting',
    run: ({ session }) => session.getState().set({ presence: {} }),
  },
  {
    keys: ['g'],
    shown: 'G',
    what: 'the whole group, or the part alone',
    section: 'Selecting',
    run: ({ session }) => session.getState().set({ reach: session.getState().reach === 'part' ? 'group' : 'part' }),
  },
  {
    keys: ['Escape'],
    shown: 'Esc',
    what: 'close the finding, then let go of what is selected',
    section: 'Selecting',
    run: (c) => {
      const { finding, select } = c.session.getState();
      if (finding !== null) closeFinding(c);
      else select([]);
    },
  },
  {
    keys: ['ArrowLeft', 'ArrowRight', 'ArrowUp', 'ArrowDown', 'PageUp', 'PageDown'],
    shown: 'Arrows, Page Up, Page Down',
    what: 'nudge by the step',
    section: 'Moving',
    run: (c, key) => arrow(c, key, 1),
  },
  {
    keys: ['Shift+ArrowLeft', 'Shift+ArrowRight', 'Shift+ArrowUp', 'Shift+ArrowDown', 'Shift+PageUp', 'Shift+PageDown'],
    shown: 'Shift + arrows',
    what: 'nudge by four steps',
    section: 'Moving',
    run: (c, key) => arrow(c, key, 4),
  },
  {
    keys: ['t'],
    shown: 'T',
    what: 'handles to turn, or to move',
    section: 'Moving',
    edits: true,
    run: ({ session }) => session.getState().set({ handles: session.getState().handles === 'move' ? 'turn' : 'move' }),
  },
  {
    keys: [',', '.'],
    shown: ', and .',
    what: 'turn in plan by a degree',
    section: 'Moving',
    edits: true,
    run: (c, key) => turnBy(c, [0, 0, 1], key === ',' ? TURN_STEP : -TURN_STEP),
  },
  {
    keys: ['Ctrl+d'],
    shown: 'Ctrl + D',
    what: 'duplicate',
    section: 'Moving',
    edits: true,
    run: (c) => duplicate(c),
  },
  {
    keys: ['Ctrl+g'],
    shown: 'Ctrl + G',
    what: 'clamp together',
    section: 'Moving',
    edits: true,
    run: (c) => clamp(c),
  },
  {
    keys: ['Ctrl+Shift+G'],
    shown: 'Ctrl + Shift + G',
    what: 'part again',
    section: 'Moving',
    edits: true,
    run: (c) => partGroup(c),
  },
  {
    keys: ['Delete', 'Backspace'],
    shown: 'Delete',
    what: 'delete what is selected',
    section: 'Moving',
    edits: true,
    run: (c) => {
      const removed = remove(c);
      if (removed !== null) c.say(sayRemoved(removed.names), removed.undo);
    },
  },
  {
    keys: ['n'],
    shown: 'N',
    what: 'the next finding, worst first',
    section: 'Findings',
    run: (c) => stepFinding(c, 1),
  },
  {
    keys: ['Shift+N'],
    shown: 'Shift + N',
    what: 'the finding before',
    section: 'Findings',
    run: (c) => stepFinding(c, -1),
  },
  {
    keys: ['i'],
    shown: 'I',
    what: 'all gaps as a list',
    section: 'Findings',
    run: ({ session }) => session.getState().set({ sheet: 'gaps' }),
  },
  {
    keys: ['p'],
    shown: 'P',
    what: 'open the shelf',
    section: 'The rest',
    edits: true,
    run: ({ session }) => session.getState().set({ sheet: 'shelf' }),
  },
  {
    keys: ['r'],
    shown: 'R',
    what: 'gap rules',
    section: 'The rest',
    run: ({ session }) => session.getState().set({ sheet: 'rules' }),
  },
  {
    keys: ['m', 'ContextMenu', 'Shift+F10'],
    shown: 'M',
    what: 'the menu for what is selected',
    section: 'The rest',
    run: ({ session }) => {
      if (session.getState().selected.length > 0) session.getState().set({ menuAt: menuPlace() });
    },
  },
  {
    keys: ['Ctrl+z'],
    shown: 'Ctrl + Z',
    what: 'undo',
    section: 'The rest',
    edits: true,
    run: ({ open }) => open.getState().undo(),
  },
  {
    keys: ['Ctrl+Shift+Z', 'Ctrl+y'],
    shown: 'Ctrl + Shift + Z',
    what: 'redo',
    section: 'The rest',
    edits: true,
    run: ({ open }) => open.getState().redo(),
  },
  {
    keys: ['?', 'Shift+?'],
    shown: '?',
    what: 'this sheet',
    section: 'The rest',
    run: ({ session }) => session.getState().set({ sheet: 'keys' }),
  },
];

/** Beside what has the focus, or in the middle of the window. */
function menuPlace(): { x: number; y: number } {
  const focus = document.activeElement;
  if (focus === null || focus === document.body || focus.tagName === 'CANVAS') {
    return { x: window.innerWidth * 0.4, y: window.innerHeight * 0.35 };
  }
  const { left, top } = focus.getBoundingClientRect();
  return { x: left + 12, y: top };
}

/** The name under which a press stands in the table. */
export function keyName(event: Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'shiftKey' | 'altKey'>): string {
  const isLetter = /^[a-zA-Z]$/.test(event.key);
  const key = isLetter ? (event.shiftKey ? event.key.toUpperCase() : event.key.toLowerCase()) : event.key;
  const shift = event.shiftKey && (isLetter || event.key.length > 1) ? 'Shift+' : '';
  return `${event.ctrlKey || event.metaKey ? 'Ctrl+' : ''}${event.altKey ? 'Alt+' : ''}${shift}${key}`;
}
