/** Where a picture will be: dye with a laser line and two scribed marks, and the word that there is none. */
export const BlankStub = () => (
  <>
    <svg viewBox="0 0 168 112" preserveAspectRatio="xMidYMid slice" className="scribed" aria-hidden="true" fill="none">
      <path d="M0 40h168M0 46h168M110 0v112" stroke="var(--scribe-faint)" />
      <path d="M100 40h20M110 30v20" stroke="var(--scribe)" />
      <circle cx="110" cy="40" r="6" stroke="var(--scribe)" />
      <path d="M40 0 168 73" stroke="var(--laser)" strokeWidth="1.4" />
    </svg>
    <span className="job-blank">no picture yet</span>
  </>
);
