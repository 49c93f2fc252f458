/** Makes something of an object that never changes once, and keeps it as long as the object lives. */
export function oncePer<From extends object, Made>(make: (from: From) => Made): (from: From) => Made {
  const made = new WeakMap<From, { value: Made }>();
  return (from) => {
    const known = made.get(from);
    if (known) return known.value;
    const value = make(from);
    made.set(from, { value });
    return value;
  };
}
