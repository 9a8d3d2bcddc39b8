/** Joins the class names that apply. */
export const cx = (...names: Array<string | false | null | undefined>): string => names.filter(Boolean).join(' ')
