import type { Role } from '#shared/access';
import { ShopTag } from '../../components/shop-tag';

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly role: Role;
}

export interface DemoPeopleProps {
  readonly people: readonly DemoPerson[];
  readonly busy: boolean;
  readonly onChoose: (person: DemoPerson) => void;
}

/** Made-up people of the demo team, to look around as. Only on a machine of one's own. */
export function DemoPeople({ people, busy, onChoose }: DemoPeopleProps) {
  return (
    <section aria-labelledby="demo-people" className="mt-8 border-t border-dashed border-line pt-4">
      <h2 id="demo-people" className="font-bold">
        Or look around in the demo shop
      </h2>
      <p className="text-sm text-soft">One click signs you in as one of its people.</p>
      <ul className="mt-3 grid grid-cols-2 gap-2.5">
        {people.map((person) => (
          <li key={person.email}>
            <button type="button" disabled={busy} className="w-full text-left" onClick={() => onChoose(person)}>
              <ShopTag className="w-full hover:[--paper-edge:var(--ink)]">
                <span className="block py-0.5">
                  {person.name}
                  <span className="block text-sm font-normal text-soft">{person.role}</span>
                </span>
              </ShopTag>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
