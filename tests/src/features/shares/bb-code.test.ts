import { describe, expect, it } from 'vitest';
import { CAUTION_SHORT } from '#shared/review';
import { bbCode } from '../../../../src/features/shares/bb-code';
import { fileName } from '../../../../src/features/shares/taken-sheet';

const FACTS = {
  projectName: 'Harbour Lane pickup',
  sceneName: 'Layout 3',
  number: 7,
  sentence: 'Brake pedal hits Column.',
  url: 'https://gaps.example/s/token',
  pictureUrl: 'https://gaps.example/api/shared/token/picture',
};

describe('the code for a build thread', () => {
  it('puts the picture first, as a way to the link, and ends with the caution', () => {
    const lines = bbCode(FACTS).split('\n');
    expect(lines[0]).toBe(
      '[url=https://gaps.example/s/token][img]https://gaps.example/api/shared/token/picture[/img][/url]',
    );
    expect(lines[1]).toBe('[b]Harbour Lane pickup: Layout 3, revision 7[/b]');
    expect(lines.at(-1)).toBe(`[i]${CAUTION_SHORT}[/i]`);
  });

  it('has no hole where there is no picture and no sentence', () => {
    const code = bbCode({ ...FACTS, pictureUrl: null, sentence: '' });
    expect(code).not.toContain('[img]');
    expect(code.split('\n')).toHaveLength(3);
  });

  it('takes the brackets out of names, which a thread would read as code', () => {
    const code = bbCode({ ...FACTS, projectName: 'Truck [url=https://bad.example]', sceneName: 'A\nB' });
    expect(code).toContain('[b]Truck (url=https://bad.example): A B, revision 7[/b]');
  });

  it('names a file as every system takes it', () => {
    expect(fileName('Dad’s "50/52" pickup', 'Layout: 3', 7)).toBe('Dads-5052-pickup-Layout-3-revision-7.png');
  });
});
