/** What stops a form, above its buttons and said aloud. `message`: of the form's root (null: nothing), `fields`: number of wrong fields. */
export function ErrorSummary({ message, fields = 0 }: { message?: string | undefined; fields?: number }) {
  const marked =
    fields === 0 ? '' : fields === 1 ? 'One field needs another look.' : `${fields} fields need another look.`;
  const text = [message, marked].filter(Boolean).join(' ');
  return (
    <div role="alert" className={text ? 'border-l-4 border-oxide pl-3 font-semibold text-oxide' : ''}>
      {text}
    </div>
  );
}
