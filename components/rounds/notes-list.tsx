/** The sentences that the statistics library writes beside its figures. */
export function NotesList({ notes }: { notes: readonly string[] }) {
  if (notes.length === 0) return null;
  return (
    <ul aria-label="Notes" className="max-w-measure list-disc pl-5">
      {notes.map((note) => (
        <li key={note}>{note}</li>
      ))}
    </ul>
  );
}
