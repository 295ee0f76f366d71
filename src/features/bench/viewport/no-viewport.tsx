// What stands where the scene would be if it could be drawn.
export function NoViewport({ why }: { readonly why: 'missing' | 'failed' }) {
  return (
    <div className="no-viewport" role="status">
      <p className="font-bold">{why === 'missing' ? 'The scene cannot be drawn here.' : 'Drawing the scene failed.'}</p>
      <p>
        {why === 'missing'
          ? 'This browser has no WebGL 2, or it is switched off. Parts, tape, gaps and rules all work; only the picture is missing. A current browser with hardware acceleration on shows it.'
          : 'Parts, tape, gaps and rules still work. Load the page again to have the picture back.'}
      </p>
    </div>
  );
}
