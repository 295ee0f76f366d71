// @vitest-environment happy-dom
import { cleanup, fireEvent, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { RollCallKey } from '#shared/review';
import { PartsRail } from '../../../../src/features/bench/rail/parts-rail';
import { ConflictDialog } from '../../../../src/features/bench/top-bar/conflict-dialog';
import { SaveWords } from '../../../../src/features/bench/top-bar/save-words';
import { TopBar } from '../../../../src/features/bench/top-bar/top-bar';
import { RulesSheet } from '../../../../src/features/bench/rules/rules-sheet';
import { LasersSheet } from '../../../../src/features/bench/lasers/lasers-sheet';
import type { SaveState } from '../../../../src/document/types';
import { finding, mount, smallScene, testBench } from './support';

afterEach(cleanup);

const tag = (name: string) => screen.getByRole('button', { name: new RegExp(`^${name}`) });

describe('the parts rail', () => {
  it('selects, takes the group at the second click, adds with Shift', () => {
    const bench = testBench();
    mount(bench, <PartsRail />);
    fireEvent.click(tag('Brake pedal'));
    expect(tag('Brake pedal').getAttribute('aria-pressed')).toBe('true');
    expect(tag('Clutch pedal').getAttribute('aria-pressed')).toBe('false');
    fireEvent.click(tag('Brake pedal'));
    expect(tag('Clutch pedal').getAttribute('aria-pressed')).toBe('true');
    expect(screen.getByText(/all together/)).toBeDefined();
    fireEvent.click(tag('Wiper'), { shiftKey: true });
    expect(bench.session.getState().selected).toEqual(['brake-pedal', 'wiper']);
  });

  it('fades with the eye, takes off the bench, puts back; none of it is an edit', () => {
    const bench = testBench();
    mount(bench, <PartsRail />);
    fireEvent.click(screen.getByRole('button', { name: 'Fade Wiper' }));
    fireEvent.click(screen.getByRole('button', { name: 'Take Wiper off the bench' }));
    expect(bench.session.getState().presence).toEqual({ wiper: 'off' });
    fireEvent.click(screen.getByRole('button', { name: 'Put Wiper back on the bench' }));
    expect(bench.session.getState().presence).toEqual({});
    expect(bench.open.getState().undoLabel).toBeNull();
  });

  it('changes the fitting order by key and says so', () => {
    const bench = testBench();
    mount(bench, <PartsRail />);
    fireEvent.keyDown(tag('Wiper'), { key: 'ArrowLeft', altKey: true });
    expect(
      bench.open
        .getState()
        .scene.components.map((c) => c.id)
        .slice(-2),
    ).not.toEqual(['clutch-pedal', 'wiper']);
    expect(screen.getByText(/Wiper is now number 5 of 6 in the fitting order/)).toBeDefined();
    expect(bench.open.getState().undoLabel).not.toBeNull();
  });

  it('marks the parts that are in trouble by their worst finding', () => {
    const bench = testBench({
      findings: [finding('wiper', 'column', 'tight'), finding('wiper', 'floor', 'clears', { gap: 99, margin: 89 })],
    });
    mount(bench, <PartsRail />);
    expect(within(tag('Wiper')).getByText('tight')).toBeDefined();
    expect(within(tag('Floor')).queryByText('clears')).toBeNull();
  });

  it('calls the roll: what is placed, not on this car, or missing', () => {
    const answer = vi.fn<(keys: readonly RollCallKey[]) => void>();
    const bench = testBench();
    mount(bench, <PartsRail />, { absent: ['booster'], setAbsent: answer });
    // of eleven only the wiper is whole: the column lacks its joint, the booster is not on this car
    expect(screen.getByText('9 missing')).toBeDefined();
    fireEvent.click(screen.getByRole('button', { name: /^Roll-call/ }));
    const sheet = screen.getByRole('dialog', { name: 'Roll-call' });
    const row = (text: RegExp) =>
      within(sheet)
        .getAllByRole('listitem')
        .find((li) => text.test(li.textContent ?? ''))!;
    expect(row(/^steering column/).textContent).toContain('missing: its joint');
    expect(row(/^wiper/).textContent).toContain('placed');
    expect(row(/^brake booster/).textContent).toContain('not on this car');
    fireEvent.click(within(row(/^heater/)).getByRole('button', { name: 'Not on this car' }));
    expect(answer).toHaveBeenCalledWith(['booster', 'heater']);
    fireEvent.click(within(row(/^brake booster/)).getByRole('button', { name: 'It is on this car' }));
    expect(answer).toHaveBeenLastCalledWith([]);
    fireEvent.click(within(row(/^throttle/)).getByRole('button', { name: 'Place one' }));
    expect(bench.session.getState()).toMatchObject({ sheet: 'shelf', shelfFor: 'throttle' });
  });

  it('reports a pedal box that hangs on one plane only', () => {
    mount(testBench(), <PartsRail />);
    expect(screen.getByText('Pedal box has no joint to the firewall and the cowl')).toBeDefined();
    cleanup();
    const scene = smallScene();
    const jointed = {
      ...scene,
      rules: {
        ...scene.rules,
        pairs: [
          ...scene.rules.pairs,
          { between: [{ component: 'brake-pedal' }, { component: 'firewall' }], joint: { allow: 1 } } as const,
        ],
      },
    };
    mount(testBench({ scene: jointed }), <PartsRail />, { words: 'uk' });
    expect(screen.getByText('Pedal box has no joint to the scuttle')).toBeDefined();
  });
});

describe('the head of the bench', () => {
  it('names what undo takes back', () => {
    const bench = testBench();
    mount(bench, <TopBar />);
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Nothing to undo' }).disabled).toBe(true);
    cleanup();
    bench.open.getState().apply({ label: 'Move Wiper', edit: (s) => ({ ...s, name: 'Layout 2' }) });
    mount(bench, <TopBar />);
    fireEvent.click(screen.getByRole('button', { name: 'Undo: Move Wiper' }));
    expect(bench.open.getState().scene.name).toBe('Layout 1');
  });

  it('has nothing to undo for those who only look', () => {
    mount(testBench({ canEdit: false }), <TopBar />);
    expect(screen.queryByRole('button', { name: /undo/i })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Layout 1' })).toBeNull();
    expect(screen.getByRole('heading', { name: 'Layout 1' })).toBeDefined();
  });

  const conflict: SaveState = {
    kind: 'conflict',
    saveNumber: 4,
    mine: smallScene(),
    theirs: {
      ...smallScene(),
      components: smallScene().components.map((c) => (c.id === 'wiper' ? { ...c, tolerance: 5 } : c)),
    },
    records: ['components wiper'],
  };

  it.each<[SaveState, string]>([
    [{ kind: 'saved', saveNumber: 3 }, 'saved'],
    [{ kind: 'saving', saveNumber: 3 }, 'saving'],
    [{ kind: 'offline', saveNumber: 3, reason: 'No answer from the server.' }, 'offline, kept here'],
    [{ kind: 'read-only', saveNumber: 3 }, 'to look at only'],
  ])('says where the document stands: %o', (save, words) => {
    const bench = testBench();
    bench.open.setState({ save });
    mount(bench, <SaveWords />);
    expect(screen.getByRole('status').textContent).toContain(words);
  });

  it('shows both versions side by side and settles on the chosen one', () => {
    const bench = testBench();
    const settle = vi.fn<(choice: 'mine' | 'theirs') => void>();
    bench.open.setState({ save: conflict, settle });
    mount(
      bench,
      <>
        <SaveWords />
        <ConflictDialog />
      </>,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Look at both' }));
    const row = screen.getByRole('row', { name: /^Wiper/ });
    expect(
      within(row)
        .getAllByRole('cell')
        .map((c) => c.textContent),
    ).toEqual(['tolerance 5/64"', 'tolerance 13/64"']);
    fireEvent.click(screen.getByRole('button', { name: 'Take theirs' }));
    expect(settle).toHaveBeenCalledWith('theirs');
  });
});

describe('the sheets', () => {
  const typeIn = (label: string, text: string): void => {
    const field = screen.getByLabelText(label);
    fireEvent.focus(field);
    fireEvent.change(field, { target: { value: text } });
    fireEvent.blur(field);
  };

  it('keep one table of gap rules, each with where it comes from, all to be changed and set back', () => {
    const bench = testBench();
    bench.session.getState().set({ sheet: 'rules' });
    mount(bench, <RulesSheet />);
    const rows = screen.getAllByRole('row').slice(1);
    expect(rows).toHaveLength(2 + smallScene().rules.pairs.length);
    for (const row of rows) expect(row.textContent).toMatch(/common practice, no source/);
    typeIn('Gap, any pedal to any steering column', '5/8');
    const rule = () => bench.open.getState().scene.rules.pairs.find((r) => r.gap === 15.875);
    expect(rule()).toBeDefined();
    const changed = screen.getByRole('row', { name: /^any pedal to any steering column/ });
    expect(changed.textContent).toContain('yours');
    fireEvent.click(within(changed).getByRole('button', { name: 'set back' }));
    expect(rule()).toBeUndefined();
    fireEvent.change(screen.getByLabelText('Between'), { target: { value: 'component wiper' } });
    fireEvent.change(screen.getByLabelText('and'), { target: { value: 'group pedal-box' } });
    fireEvent.click(screen.getByRole('button', { name: 'Add it' }));
    expect(screen.getByRole('row', { name: /^Wiper to any of Pedal box/ }).textContent).toContain('yours');
    fireEvent.click(screen.getByRole('button', { name: 'Set all back to the table of a new scene' }));
    expect(screen.queryByRole('row', { name: /^Wiper to any of Pedal box/ })).toBeNull();
  });

  it('throw lasers, move and take them away', () => {
    const bench = testBench();
    bench.session.getState().set({ sheet: 'lasers' });
    mount(bench, <LasersSheet />);
    fireEvent.click(screen.getByRole('button', { name: 'level' }));
    const lasers = () => bench.open.getState().scene.lasers;
    expect(lasers()[1]).toMatchObject({ name: 'Laser 2', normal: [0, 0, 1] });
    const row = screen.getAllByRole('listitem')[1]!;
    const up = within(row).getAllByLabelText('up')[0]!;
    fireEvent.focus(up);
    fireEvent.change(up, { target: { value: '24' } });
    fireEvent.blur(up);
    expect(lasers()[1]!.point[2]).toBeCloseTo(24 * 25.4);
    fireEvent.click(screen.getByRole('button', { name: 'Take Laser 2 away' }));
    expect(lasers()).toHaveLength(1);
  });
});
