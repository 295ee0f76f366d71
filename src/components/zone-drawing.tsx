// A firewall zone seen from the side, scribed on dye: hood, cowl, raked firewall, toe board, the column with the laser along
// it, a hanging pedal with its swept arc, the cylinder in front. It stands where there is no picture yet, and at the door.
import { classes } from './classes';

export interface ZoneDrawingProps {
  /** For a stub: cropped to the pedal box, without figures. */
  readonly small?: boolean;
  readonly className?: string;
}

export function ZoneDrawing({ small = false, className }: ZoneDrawingProps) {
  return (
    <svg
      viewBox={small ? '60 120 330 212' : '0 0 480 520'}
      preserveAspectRatio="xMidYMid slice"
      className={classes('block bg-dye', className)}
      fill="none"
      stroke="var(--scribe-soft)"
      strokeWidth="1.4"
      aria-hidden="true"
    >
      <Body />
      <Box />
      <Column />
      {!small && <Figures />}
    </svg>
  );
}

const Body = () => (
  <g>
    {/* hood, cowl, windshield */}
    <path d="M-10 176C60 150 120 138 186 138l34 -8 70 -120" />
    <path d="M-10 184C60 158 122 146 186 146l38 2 12 -14" stroke="var(--scribe-faint)" />
    <path d="M220 130l52 4" />
    {/* firewall with its rake, toe board, floor: sheet metal has two lines */}
    <path d="M196 146 176 352 214 436H490" />
    <path d="M201 148 181 351 217 431H490" stroke="var(--scribe-faint)" />
    {/* engine corner */}
    <path
      d="M-10 262h66l14 22v66l-12 20H-10"
      fill="color-mix(in srgb, var(--red-oxide) 32%, transparent)"
      stroke="var(--scribe-faint)"
    />
    <path d="M-10 302h70M-10 330h72" stroke="var(--scribe-faint)" />
    {/* seat */}
    <path d="M420 436c-6-40 6-62 70-66" stroke="var(--scribe-faint)" />
  </g>
);

const Box = () => (
  <g>
    {/* bracket, bolted to firewall and cowl */}
    <path
      d="M191 196l6-46h62l8 34v46l-20 20h-61z"
      fill="color-mix(in srgb, var(--black-oxide) 70%, transparent)"
      stroke="var(--scribe)"
    />
    {/* cylinder with its cap, push rod */}
    <path
      d="M190 224H112v-26h79z"
      fill="color-mix(in srgb, var(--raw-aluminium) 30%, transparent)"
      stroke="var(--scribe)"
    />
    <path d="M112 204h-12v14h12M128 198v-22h42v22M136 176v-8h26v8" stroke="var(--scribe)" />
    <path d="M190 211h52" stroke="var(--scribe)" strokeWidth="2.4" />
    {/* the swept arc */}
    <path d="M286 362A178 178 0 0 1 212 354" stroke="var(--scribe-faint)" strokeDasharray="4 4" />
    <path d="M243 187 218 350l-10 2 14 12 10-5 20-166" stroke="var(--scribe-faint)" strokeDasharray="3 4" />
    {/* the arm at rest, its pad */}
    <path
      d="M240 182l13-2 35 166 11 6-6 14-16-7-8-6z"
      fill="color-mix(in srgb, var(--zinc-yellow) 38%, transparent)"
      stroke="var(--scribe)"
    />
    <circle cx="246" cy="184" r="6.5" stroke="var(--scribe)" />
    <circle cx="246" cy="184" r="1.6" fill="var(--scribe)" stroke="none" />
    <circle cx="246" cy="211" r="3" stroke="var(--scribe)" />
    <circle cx="205" cy="170" r="3.4" />
    <circle cx="204" cy="238" r="3.4" />
  </g>
);

const Column = () => (
  <g>
    <path d="M490 122 300 246M490 144 312 260" stroke="var(--scribe)" />
    <path d="M300 246l12 14M290 252l13 15M290 252 176 326M303 267 180 347" stroke="var(--scribe-soft)" />
    <circle cx="297" cy="257" r="9" stroke="var(--scribe)" />
    <path d="M-10 455 490 131" stroke="var(--laser)" strokeWidth="1.6" />
    {/* where arm and column come closest */}
    <path d="M268 262l12 3" stroke="var(--tight)" strokeWidth="2.6" />
  </g>
);

const Figures = () => (
  <g>
    <path d="M274 266v34h38" stroke="var(--tight)" strokeWidth="1" />
    <rect x="312" y="286" width="74" height="28" fill="var(--dye-deep)" stroke="var(--tight)" />
    <path d="m323 307 4-13m3 13 4-13" stroke="var(--tight)" strokeWidth="2" strokeLinecap="round" />
    <text x="344" y="305" fill="var(--tight)" stroke="none" fontSize="15" fontWeight="600" fontFamily="var(--font)">
      3/16&quot;
    </text>
    <path d="M296 372v58M288 372h16M288 430h16" stroke="var(--scribe-faint)" strokeWidth="1" />
    <text x="308" y="406" fill="var(--scribe-soft)" stroke="none" fontSize="14" fontFamily="var(--font)">
      6 3/8&quot;
    </text>
  </g>
);
