/** What keeps a form from being done, above its buttons. Announced when it appears. */
export const FormFault = ({ text }: { readonly text: string | null }) => (
  <div role="alert" className="empty:hidden">
    {text !== null && <p className="border-l-4 border-hits bg-lift px-3 py-2 font-semibold text-hits">{text}</p>}
  </div>
);
