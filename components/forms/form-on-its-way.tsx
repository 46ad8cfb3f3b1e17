export function FormOnItsWay() {
  return (
    <p role="status" className="text-ink-soft">
      The form is on its way
    </p>
  );
}
