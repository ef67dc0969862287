import { createContext, type ReactNode, use, useLayoutEffect, useRef } from 'react';
import { useLocation } from 'react-router';

/** Holds the address whose title last took the focus; the first page of a visit keeps the browser's own start. */
export const FocusedAddress = createContext<{ current: string } | null>(null);

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
  useLayoutEffect(() => {
    if (!focused || focused.current === pathname) return;
    focused.current = pathname;
    heading.current?.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, [focused, pathname]);
  return (
    <>
      <title>{`${title} · Tiltwright`}</title>
      <h1 ref={heading} tabIndex={-1} className={className}>
        {children ?? title}
      </h1>
    </>
  );
}
