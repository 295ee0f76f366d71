import { Link } from 'react-router-dom';

export type PictureState =
  | { readonly kind: 'there'; readonly url: string }
  /** Drawn in a moment, by this browser. */
  | { readonly kind: 'awaited' }
  | { readonly kind: 'none' };

export interface FindingPictureProps {
  readonly picture: PictureState;
  readonly alt: string;
  /** The bench, at the witness mark. */
  readonly to: string;
}

/** A finding's picture leads to its witness mark; without one the plate says so. */
export function FindingPicture({ picture, alt, to }: FindingPictureProps) {
  if (picture.kind === 'there') {
    return (
      <Link to={to} className="finding-plate" aria-label={`${alt}: see it on the bench`}>
        <img src={picture.url} alt="" width={640} height={420} loading="lazy" />
      </Link>
    );
  }
  return (
    <Link to={to} className="finding-plate finding-plate-blank">
      {picture.kind === 'awaited' ? (
        <>
          <span className="laser-run" aria-hidden="true" />
          being drawn
        </>
      ) : (
        'see it on the bench'
      )}
    </Link>
  );
}
