import { useCallback } from 'react'
import { useSearchParams } from 'react-router-dom'
import { LIMITS } from '#shared/contract/limits'
import { PageHeader } from '@/components/ui/page-header'
import { CatalogueList } from '@/features/exercises/components/catalogue-list'
import { CatalogueSearch } from '@/features/exercises/components/catalogue-search'

/** Every published exercise. */
export function Component() {
  const [params, setParams] = useSearchParams()
  const search = (params.get('search') ?? '').trim().slice(0, LIMITS.search.max)
  const onSearch = useCallback(
    (text: string) => setParams(text === '' ? {} : { search: text }, { replace: true, preventScrollReset: true }),
    [setParams],
  )
  return (
    <>
      <PageHeader title="Catalogue" />
      <div className="mb-4">
        <CatalogueSearch search={search} onSearch={onSearch} />
      </div>
      <CatalogueList search={search} />
    </>
  )
}
