import { createContext, type ReactNode, use, useLayoutEffect, useRef } from 'react';
import { useLocation, useNavigationType } from 'react-router';

export interface FocusMemory {
  /** The address whose title last took the focus, or the first one of the visit. */
  address: string;
  /** False on the first page of a visit, which keeps the browser's own start. */
  moved: boolean;
}
export const FocusedAddress = createContext<{ current: FocusMemory } | null>(null);

interface PageTitleProps {
  /** For the tab and the history; the heading itself where no children are given. */
  title: string;
  children?: ReactNode;
  className?: string;
}

/** The page's h1. After a step to another page it takes the focus, so that keyboard and screen reader start there. */
export function PageTitle({ title, children, className = 'text-head' }: PageTitleProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  const focused = use(FocusedAddress);
  const { pathname } = useLocation();
  const way = useNavigationType();
  useLayoutEffect(() => {
    if (!focused) return;
    const { address, moved } = focused.current;
    // A page may change its heading once its data is there; the focus must not fall off the page with the first one.
    const lost = moved && document.activeElement === document.body;
    if (address === pathname && !lost) return;
    heading.current?.focus({ preventScroll: true });
    if (address === pathname) return;
    focused.current = { address: pathname, moved: true };
    // Going back, the browser finds the former place by itself.
    if (way !== 'POP') window.scrollTo(0, 0);
  }, [focused, pathname, way]);
  return (
    <>
      <title>{`${title} · Tiltwright`}</title>
      <h1 ref={heading} tabIndex={-1} className={className}>
        {children ?? title}
      </h1>
    </>
  );
}
