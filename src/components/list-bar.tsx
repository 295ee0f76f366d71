import { SearchField } from './search-field';
import { Select } from './text-field';

export interface ListBarProps<S extends string, T extends string> {
  readonly searchLabel: string;
  readonly search: string;
  readonly sort: S;
  readonly sorts: Readonly<Record<S, string>>;
  readonly state: T;
  /** The drawers there are; with one alone there is no choice. */
  readonly states: Readonly<Partial<Record<T, string>>>;
  readonly onChange: (change: { readonly search?: string; readonly sort?: S; readonly state?: T }) => void;
}

/** Search, order and drawer of a list, in one row. */
export function ListBar<S extends string, T extends string>(props: ListBarProps<S, T>) {
  const { searchLabel, search, sort, sorts, state, states, onChange } = props;
  const drawers = Object.entries(states) as [T, string][];
  return (
    <div className="mb-4 flex flex-wrap items-end gap-3">
      <SearchField
        label={searchLabel}
        value={search}
        className="min-w-0 grow basis-60"
        onSearch={(text) => onChange({ search: text })}
      />
      <Select
        label="Order"
        labelHidden
        className="grow sm:w-44 sm:grow-0"
        value={sort}
        onChange={(event) => onChange({ sort: event.target.value as S })}
      >
        {Object.entries<string>(sorts).map(([value, label]) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </Select>
      {drawers.length > 1 && (
        <Select
          label="Which"
          labelHidden
          className="grow sm:w-36 sm:grow-0"
          value={state}
          onChange={(event) => onChange({ state: event.target.value as T })}
        >
          {drawers.map(([value, label]) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </Select>
      )}
    </div>
  );
}
