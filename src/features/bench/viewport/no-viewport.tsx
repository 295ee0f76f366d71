// What stands where the scene would be if it could be drawn.
const WORDS = {
  missing: {
    title: 'The scene cannot be drawn here.',
    text: 'This browser has no WebGL 2, or it is switched off. Parts, tape, gaps and rules all work; only the picture is missing. A current browser with hardware acceleration on shows it.',
  },
  failed: {
    title: 'Drawing the scene failed.',
    text: 'Parts, tape, gaps and rules still work. Load the page again to have the picture back.',
  },
  lost: {
    title: 'The picture is gone for the moment.',
    text: 'The computer took its graphics away from this page and should give them back by itself. Nothing of the scene is lost. If the picture stays away, load the page again.',
  },
} as const;

export function NoViewport({ why }: { readonly why: keyof typeof WORDS }) {
  const { title, text } = WORDS[why];
  return (
    <div className="no-viewport" role="status">
      <p className="font-bold">{title}</p>
      <p>{text}</p>
    </div>
  );
}
