/** One who has the design open now. */
export interface PresentPerson {
  readonly id: string;
  readonly name: string;
  readonly initials: string;
  readonly function: string;
}

const SHAPES = ["who", "who b", "who c"];

/** Who is here now, each in a shape of their own. */
export function Presence(props: { readonly people: readonly PresentPerson[] }) {
  return (
    <ul className="people" aria-label="Here now">
      {props.people.map((person, index) => (
        <li key={person.id}>
          <span
            className={SHAPES[index % SHAPES.length]}
            title={`${person.name}, ${person.function}`}
          >
            {person.initials}
            <span className="sr">, {person.name} is here</span>
          </span>
        </li>
      ))}
    </ul>
  );
}
