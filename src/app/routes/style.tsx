export function Component() {
  return <p>style</p>;
}
