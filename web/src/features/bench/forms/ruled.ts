/** Numbers of a form as ruled lines: name at the left, number at the right, hint and fault beneath both. */
export const RULED = [
  '[&>div:has(>div>input)]:grid-cols-[minmax(0,1fr)_8.75rem]',
  '[&>div:has(>div>input)]:items-center',
  '[&>div:has(>div>input)]:gap-x-3',
  '[&>div:has(>div>input)>p]:col-span-2',
].join(' ')
