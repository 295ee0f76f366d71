// A firewall zone seen from the side, scribed on dye: hood, cowl, raked firewall, toe board, the column with the laser along
// it, a hanging pedal with its swept arc, the cylinder in front. It stands at the door.
import { classes } from './classes';

export const ZoneDrawing = ({ className }: { readonly className?: string }) => (
  <svg
    viewBox="0 0 480 520"
    preserveAspectRatio="xMidYMid slice"
    className={classes('scribed block bg-dye', className)}
    fill="none"
    stroke="var(--scribe-soft)"
    strokeWidth="1.3"
    aria-hidden="true"
  >
    <Body />
    <Neighbours />
    <Box />
    <Column />
    <Figures />
  </svg>
);

const fill = (finish: string, share: number): string => `color-mix(in srgb, var(--${finish}) ${share}%, transparent)`;

/** Sheet metal is drawn with both its faces. */
const Body = () => (
  <g>
    <path d="M-10 176C60 150 120 138 186 138l34-8 36-62" />
    <path d="M-10 183C60 157 122 145 186 145l38 2 12-14" stroke="var(--scribe-faint)" />
    <path d="M220 130c30-2 60 2 92 12l26 2v14" />
    <path d="M196 146 176 352 214 436H490" />
    <path d="M201 148 181 351 217 431H490" stroke="var(--scribe-faint)" />
    <path d="M214 436v22M300 436v22M386 436v22M472 436v22" stroke="var(--scribe-faint)" />
    <path d="M-10 502c40-44 96-40 122 4" fill={fill('etch-green', 14)} stroke="var(--scribe-faint)" />
    <path d="M424 436c-8-38 4-64 76-68" stroke="var(--scribe-faint)" />
  </g>
);

/** What crowds around the box: engine corner, wiper motor with its crank, heater. */
const Neighbours = () => (
  <g stroke="var(--scribe-faint)">
    <path d="M-10 262h66l14 22v66l-12 20H-10" fill={fill('red-oxide', 32)} />
    <path d="M-10 284h80M-10 306h80M-10 328h80M-10 350h80" />
    <path d="M6 262v-14h34v14" fill={fill('black-oxide', 60)} />
    <path d="M205 152h30v-8h-30z" fill={fill('zinc-yellow', 22)} />
    <circle cx="226" cy="148" r="4" />
    <path d="M226 148l-16-8M210 140l-44 2" strokeDasharray="2 3" />
    <path d="M330 172h92v58l-16 20h-76z" strokeDasharray="7 4" fill={fill('ghost', 7)} />
    <path d="M344 172v78M330 200h92" strokeDasharray="2 4" />
    <path d="M100 206C70 200 66 236 42 248" />
    <path d="M70 372h30c20 0 20 26 44 26h40" />
  </g>
);

const Box = () => (
  <g>
    <path d="M191 196l6-46h62l8 34v46l-20 20h-61z" fill={fill('black-oxide', 70)} stroke="var(--scribe)" />
    <path d="M203 150l-6 100M214 196h46" stroke="var(--scribe-faint)" />
    <path d="M190 224h-78v-26h79z" fill={fill('raw-aluminium', 30)} stroke="var(--scribe)" />
    <path d="M112 204h-12v14h12M182 198v26M174 198v26" stroke="var(--scribe)" />
    <path d="M128 198v-22h42v22M136 176v-8h26v8" fill={fill('cadmium-gold', 30)} stroke="var(--scribe)" />
    <path d="M94 211h160" strokeDasharray="12 3 2 3" strokeWidth="0.9" />
    <path d="M190 211h52" stroke="var(--scribe)" strokeWidth="2.6" />
    <path d="M286 362A178 178 0 0 1 212 354" stroke="var(--scribe-soft)" strokeDasharray="4 4" />
    <path d="M243 187 218 350l-10 2 14 12 10-5 20-166" stroke="var(--scribe-faint)" strokeDasharray="3 4" />
    <path
      d="M240 182l13-2 35 166 11 6-6 14-16-7-8-6z"
      fill="color-mix(in srgb, var(--zinc-yellow) 46%, var(--dye))"
      stroke="var(--scribe)"
    />
    <circle cx="246" cy="184" r="6.5" fill="var(--dye-deep)" stroke="var(--scribe)" />
    <circle cx="246" cy="184" r="1.4" fill="var(--scribe)" stroke="none" />
    <circle cx="246" cy="211" r="3" fill="var(--dye-deep)" stroke="var(--scribe)" />
    <Bolt x={205} y={168} />
    <Bolt x={203} y={238} />
    <path d="M292 360l36 10c24 7 44 22 48 44l-6 12h-70c-6-10-10-20-9-30z" strokeDasharray="2 4" />
  </g>
);

const Bolt = ({ x, y }: { readonly x: number; readonly y: number }) => (
  <g transform={`translate(${x} ${y})`}>
    <path d="M0-4.6 4-2.3v4.6L0 4.6-4 2.3v-4.6z" fill="var(--dye-deep)" />
    <circle r="1.8" />
  </g>
);

const Column = () => (
  <g>
    <path d="M490 122 306 242l12 19L490 149z" fill={fill('raw-aluminium', 16)} stroke="none" />
    <path d="M490 122 306 242M490 149 318 261M306 242l12 19" stroke="var(--scribe)" />
    <path d="M290 252l13 15M290 252 176 326M303 267 180 347" />
    <path d="M306 242l-16 10M318 261l-15 6" stroke="var(--scribe)" />
    <circle cx="304" cy="256" r="8.5" fill="var(--dye-deep)" stroke="var(--scribe)" />
    <path d="M304 247.5v17M295.5 256h17" stroke="var(--scribe)" strokeWidth="0.9" />
    <path d="M-10 459.5 490 135.5" stroke="var(--laser)" strokeWidth="1.7" />
    <path d="M268 264l27 3" stroke="var(--tight)" strokeWidth="2.4" />
  </g>
);

const Figures = () => (
  <g stroke="var(--scribe-faint)">
    <path d="M281 268v32h31" stroke="var(--tight)" strokeWidth="1" />
    <rect x="312" y="286" width="74" height="28" fill="var(--dye-deep)" stroke="var(--tight)" />
    <path d="m323 307 4-13m3 13 4-13" stroke="var(--tight)" strokeWidth="2" strokeLinecap="round" />
    <text x="342" y="305" fill="var(--tight)" className="scribed-figure">
      3/16&quot;
    </text>
    <path d="M300 378v52M292 378h16M292 430h16" />
    <text x="311" y="400" fill="var(--scribe-soft)" className="scribed-figure">
      6 3/8&quot;
    </text>
    <path d="M149 168v-24M143 168h12M143 144h12" />
    <text x="120" y="160" fill="var(--clears)" className="scribed-figure" fontSize="12">
      7/8&quot;
    </text>
  </g>
);
