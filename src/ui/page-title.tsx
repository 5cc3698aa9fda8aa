import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';

interface PageTitleProps {
  readonly children: string;
  /** What the window is called where that is not the heading. */
  readonly windowTitle?: string;
  readonly className?: string;
}

/** The page's heading. It names the window, and takes the focus when one came here from another page. */
export function PageTitle({ children, windowTitle = children, className = 'text-xl' }: PageTitleProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  const { key } = useLocation();
  useEffect(() => {
    document.title = `${windowTitle} · Stillpoint`;
  }, [windowTitle]);
  useEffect(() => {
    // The router's first location of a page load is called so; the browser has set the focus then.
    if (key !== 'default') heading.current?.focus();
  }, [key]);
  return (
    <h1 ref={heading} tabIndex={-1} className={className}>
      {children}
    </h1>
  );
}
