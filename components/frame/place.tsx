import { Breadcrumb, type Crumb } from '@/components/ui/breadcrumb';

/**
 * Where this page is in the tree, shown within the header. A nested layout renders it at the start of its content, since the layout that
 * draws the header does not know it; style puts it into the header's free middle, so that the server's first paint has it already.
 * None of the elements around it may be positioned. On narrow screens it is a line of its own below the header.
 */
export function Place({ items }: { items: readonly Crumb[] }) {
  return (
    <div className="no-print px-4 pt-2.5 text-table md:absolute md:top-0 md:right-[19.5rem] md:left-[9.75rem] md:flex md:h-14 md:items-center md:p-0 md:text-body lg:right-[26rem]">
      <Breadcrumb items={items} />
    </div>
  );
}
