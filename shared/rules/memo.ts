/**
 * Remembers what a function made of an object for as long as the object lives. For pure functions of objects that are never
 * changed, such as solutions and rule sets: the answer is the same, only sooner.
 */
export function memo<K extends object, V>(make: (key: K) => V): (key: K) => V {
  const known = new WeakMap<K, V>()
  return (key) => {
    const found = known.get(key)
    if (found !== undefined) return found
    const made = make(key)
    known.set(key, made)
    return made
  }
}
