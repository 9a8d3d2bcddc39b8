import { useEffect, useState } from 'react'
import { LIMITS } from '#shared/contract/limits'
import { Field } from '@/components/ui/field'
import { TextInput } from '@/components/ui/inputs'

/** Typing rests this long before the list is fetched. */
const REST = 250

/** Part of a name; the list follows as it is typed. */
export function CatalogueSearch({ search, onSearch }: { search: string; onSearch: (search: string) => void }) {
  const [text, setText] = useState(search)
  useEffect(() => {
    const wanted = text.trim()
    if (wanted === search) return
    const timer = setTimeout(() => onSearch(wanted), REST)
    return () => clearTimeout(timer)
  }, [text, search, onSearch])
  return (
    <form role="search" onSubmit={(event) => event.preventDefault()}>
      <Field label="Search by name" className="max-w-sm">
        <TextInput
          type="search"
          value={text}
          maxLength={LIMITS.search.max}
          onChange={(event) => setText(event.target.value)}
        />
      </Field>
    </form>
  )
}
