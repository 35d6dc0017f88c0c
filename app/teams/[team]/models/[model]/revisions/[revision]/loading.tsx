import { SheetSkeleton } from '@/components/sheet/sheet-skeleton'

export default SheetSkeleton
