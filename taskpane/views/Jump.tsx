/**
 * A link to a section: scrolls there and moves the focus to its heading. A host's panel has no history of addresses,
 * so that the link itself is not followed.
 */
export function Jump(props: { readonly to: string; readonly kind?: string; readonly name: string }) {
  const { to, kind, name } = props;
  return (
    <a
      href={`#${to}`}
      class={kind}
      onClick={(event) => {
        event.preventDefault();
        const heading = document.getElementById(`${to}-title`);
        heading?.scrollIntoView();
        heading?.focus({ preventScroll: true });
      }}
    >
      {name}
    </a>
  );
}
