import { useQuery } from '@tanstack/react-query';
import { mayShow, ROLES, type Role } from '#shared/access';
import type { Person } from '#shared/api';
import { Button } from '../../components/button';
import { ErrorState, LoadingState } from '../../components/states';
import { Cell, Head, Row, Table } from '../../components/table';
import { Select } from '../../components/text-field';
import { useHeld } from '../../components/use-held';
import { When } from '../../components/when';
import { tell } from '../../lib/api-problem';
import { useMe } from '../../lib/me';
import { peopleQuery } from '../../lib/queries/teams';

export interface PeopleTableProps {
  readonly teamId: string;
  readonly role: Role;
  /** `letGo` takes the choice back where it could not be kept. */
  readonly onChangeRole: (person: Person, role: Role, letGo: () => void) => void;
  readonly onRemove: (person: Person) => void;
  readonly onHandOver: (person: Person) => void;
}

/** Everybody in the team. Owners change and remove; the others read. */
export function PeopleTable({ teamId, role, onChangeRole, onRemove, onHandOver }: PeopleTableProps) {
  const people = useQuery(peopleQuery(teamId));
  const me = useMe();
  const mayChange = mayShow(role, 'people.change');
  if (people.isPending) return <LoadingState what="the people" />;
  if (people.isError) return <ErrorState {...tell(people.error)} onRetry={() => void people.refetch()} />;
  return (
    <Table
      label="People of the team"
      head={
        <>
          <Head>Name</Head>
          <Head>Mail address</Head>
          <Head>Role</Head>
          <Head>Since</Head>
          {mayChange && (
            <Head>
              <span className="sr-only">Actions</span>
            </Head>
          )}
        </>
      }
    >
      {people.data.map((person) => {
        const isMe = person.id === me.id;
        return (
          <Row key={person.id}>
            <Cell className="font-bold">
              {person.name}
              {isMe && <span className="font-normal text-soft"> (you)</span>}
            </Cell>
            <Cell head="Mail address" className="break-all">
              {person.email}
            </Cell>
            <Cell head="Role">{mayChange ? <RoleSelect person={person} onChange={onChangeRole} /> : person.role}</Cell>
            <Cell head="Since">
              <When iso={person.since} />
            </Cell>
            {mayChange && (
              <Cell className="sm:text-right">
                {!isMe && (
                  <span className="inline-flex flex-wrap gap-x-4 gap-y-1 sm:justify-end">
                    {person.role !== 'owner' && (
                      <Button kind="text" size="small" onClick={() => onHandOver(person)}>
                        Hand over<span className="sr-only"> to {person.name}</span>
                      </Button>
                    )}
                    <Button kind="text" size="small" onClick={() => onRemove(person)}>
                      Remove<span className="sr-only"> {person.name}</span>
                    </Button>
                  </span>
                )}
              </Cell>
            )}
          </Row>
        );
      })}
    </Table>
  );
}

interface RoleSelectProps {
  readonly person: Person;
  readonly onChange: (person: Person, role: Role, letGo: () => void) => void;
}

function RoleSelect({ person, onChange }: RoleSelectProps) {
  const [role, hold, letGo] = useHeld(person.role);
  return (
    <Select
      label={`Role of ${person.name}`}
      labelHidden
      className="!inline-grid w-36"
      value={role}
      onChange={(event) => {
        const next = event.target.value as Role;
        hold(next);
        onChange(person, next, letGo);
      }}
    >
      {ROLES.map((each) => (
        <option key={each} value={each}>
          {each}
        </option>
      ))}
    </Select>
  );
}
