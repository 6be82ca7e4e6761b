import type { PersonView } from "../../lib/review/views";

/** Who is signed in, and the way out. */
export function SignedIn(props: { readonly me: PersonView }) {
  return (
    <div className="people">
      <span className="who" title={`${props.me.name}, ${props.me.roles.join(", ")}`}>
        {props.me.initials}
      </span>
      <a className="btn quiet" href="/sign-out">
        Sign out
      </a>
    </div>
  );
}
