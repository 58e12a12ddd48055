/** The least a page can be: what its scripts weigh is what the framework costs. */
export default function Empty() {
  return <p>Empty</p>;
}
