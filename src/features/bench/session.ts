// What belongs to this sitting at the bench and to nobody else: what is selected, faded, scrubbed, looked at. Never saved,
// never undone.
import type { RollCallKey } from '#shared/review';
import { createStore, type StoreApi } from 'zustand';
import type { Positions } from './viewport/bodies';
import type { StandpointId } from './standpoints/standpoints';

export type Presence = 'faded' | 'off';
/** What a move or turn takes along: the part alone, or the group it is clamped in. */
export type Reach = 'part' | 'group';
export type HandleKind = 'move' | 'turn';
export type SheetKind = 'shelf' | 'rules' | 'keys' | 'gaps' | 'lasers' | 'conflict' | 'roll-call' | 'ladder' | 'tape';

export interface CutOn {
  readonly axis: 0 | 1 | 2;
  readonly datum: string | null;
  readonly offset: number;
  readonly isFlipped: boolean;
}

export interface SessionState {
  /** Ids of components; the last is the one that the tape is for. */
  readonly selected: readonly string[];
  readonly reach: Reach;
  readonly hovered: string | null;
  readonly presence: Readonly<Record<string, Presence>>;
  /** By motionKey. A motion that is not there is at rest. */
  readonly positions: Positions;
  /** The motion whose swept arc is shown, by motionKey. */
  readonly arc: string | null;
  /** The finding that is open, by findingKey. */
  readonly finding: string | null;
  /** The finding that is pointed at. */
  readonly hoveredFinding: string | null;
  readonly standpoint: StandpointId | null;
  /** The cutaway: on a datum of an axis (its key; null: the usual one), a way off it, mm, and which side goes. */
  readonly cutOn: CutOn | null;
  readonly handles: HandleKind;
  /** Step of keys and handles, mm; null: the usual one of the display. */
  readonly step: number | null;
  readonly showsLasers: boolean;
  readonly sheet: SheetKind | null;
  /** The entry of the roll-call that the shelf was opened for. */
  readonly shelfFor: RollCallKey | null;
  /** Where the menu of other actions is open, CSS px of the window. */
  readonly menuAt: { readonly x: number; readonly y: number } | null;
  /** The row of the tape that has the focus: 0, 1, 2 for the axes. */
  readonly measuredAxis: 0 | 1 | 2 | null;
  /** What each axis is read off, by the datum's key; the usual one if left out. */
  readonly datums: Readonly<Partial<Record<0 | 1 | 2, string>>>;
}

export interface Session extends SessionState {
  readonly set: (change: Partial<SessionState>) => void;
  /** `adds`: keeps what is selected, and takes away what is selected already. */
  readonly select: (ids: readonly string[], adds?: boolean) => void;
  readonly setPresence: (ids: readonly string[], presence: Presence | null) => void;
  /** null: back at rest. */
  readonly setPosition: (key: string, position: number | null) => void;
}

export type SessionStore = StoreApi<Session>;

const START: SessionState = {
  selected: [],
  reach: 'part',
  hovered: null,
  presence: {},
  positions: {},
  arc: null,
  finding: null,
  hoveredFinding: null,
  standpoint: null,
  cutOn: null,
  handles: 'move',
  step: null,
  showsLasers: true,
  sheet: null,
  shelfFor: null,
  menuAt: null,
  measuredAxis: null,
  datums: {},
};

function toggled(selected: readonly string[], ids: readonly string[]): readonly string[] {
  const all = ids.every((id) => selected.includes(id));
  const rest = selected.filter((id) => !ids.includes(id));
  return all ? rest : [...rest, ...ids];
}

export function createSession(start: Partial<SessionState> = {}): SessionStore {
  return createStore<Session>()((set) => ({
    ...START,
    ...start,
    set: (change) => set(change),
    select: (ids, adds = false) =>
      set((s) => ({ selected: adds ? toggled(s.selected, ids) : ids, reach: 'part', arc: null, measuredAxis: null })),
    setPresence: (ids, presence) =>
      set((s) => {
        const next = { ...s.presence };
        for (const id of ids) {
          if (presence === null) delete next[id];
          else next[id] = presence;
        }
        return { presence: next };
      }),
    setPosition: (key, position) =>
      set((s) => {
        const { [key]: _old, ...rest } = s.positions;
        return { positions: position === null ? rest : { ...rest, [key]: position } };
      }),
  }));
}
