/** A card template for a pedal plate, dashed where it is to be cut: holes, centre lines, one dimension. */
export const TemplateDrawing = ({ className }: { readonly className?: string }) => (
  <svg
    viewBox="0 0 180 120"
    className={className}
    fill="none"
    stroke="currentColor"
    strokeWidth="1.3"
    aria-hidden="true"
  >
    <path d="M16 16h122l26 24v64H16z" strokeDasharray="6 4" />
    <circle cx="42" cy="40" r="6" />
    <circle cx="42" cy="82" r="6" />
    <circle cx="132" cy="60" r="6" />
    <circle cx="132" cy="88" r="6" />
    <circle cx="86" cy="62" r="21" />
    <path d="M86 32v60M56 62h60" strokeWidth=".8" strokeDasharray="12 3 2 3" />
    <path d="M42 30v20M32 40h20M42 72v20M32 82h20M132 50v20M122 60h20M132 78v20M122 88h20" strokeWidth=".8" />
    <path d="M42 108v8M132 108v8" strokeWidth=".8" />
    <path d="M42 112h90" stroke="var(--laser)" strokeWidth="1.4" />
  </svg>
);
