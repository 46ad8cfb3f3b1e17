const ADDRESS = /(https?:\/\/[^\s<>"]+[^\s<>".,;:)])/g;

/** Mail as it was written, with its addresses made into links. */
export function TextWithLinks({ text }: { text: string }) {
  return (
    <div className="report-text whitespace-pre-wrap wrap-anywhere">
      {text.split(ADDRESS).map((part, index) =>
        // What was captured stands at the odd places.
        index % 2 === 1 ? (
          <a key={index} href={part} className="text-link">
            {part}
          </a>
        ) : (
          part
        ),
      )}
    </div>
  );
}
