import type { InfiniteData } from '@tanstack/react-query'

/** All items of the pages fetched so far. */
export const itemsOf = <Item>({ pages }: InfiniteData<{ items: Item[] }, unknown>): Item[] =>
  pages.flatMap(({ items }) => items)
