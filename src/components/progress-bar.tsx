import { Button } from './button';

export interface ProgressBarProps {
  readonly label: string;
  /** 0 to 1; null while it is not known how much there is. */
  readonly share: number | null;
  /** Beside the label: "12 of 40 MB". */
  readonly note?: string;
  readonly onCancel?: () => void;
}

/** How far a long job is: a laser line along a steel scale. */
export function ProgressBar({ label, share, note, onCancel }: ProgressBarProps) {
  const percent = share === null ? undefined : Math.round(Math.min(1, Math.max(0, share)) * 100);
  return (
    <div className="grid gap-1.5">
      <div className="flex flex-wrap items-baseline gap-x-3">
        <span className="min-w-0 font-semibold break-words">{label}</span>
        {note !== undefined && <span className="figures text-sm text-soft">{note}</span>}
      </div>
      <div className="flex items-center gap-4">
        <div
          role="progressbar"
          aria-label={label}
          aria-valuemin={0}
          aria-valuemax={100}
          aria-valuenow={percent}
          className="progress grow"
        >
          {percent === undefined ? (
            <div className="laser-run" />
          ) : (
            <div className="progress-run" style={{ width: `${percent}%` }} />
          )}
        </div>
        {percent !== undefined && <span className="figures w-11 text-right text-sm">{percent} %</span>}
        {onCancel !== undefined && (
          <Button size="small" onClick={onCancel}>
            Cancel
          </Button>
        )}
      </div>
    </div>
  );
}
