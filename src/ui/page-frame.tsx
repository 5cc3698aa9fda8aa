import type { ReactNode } from 'react';
import { Link, NavLink } from 'react-router-dom';
import { Mark } from './mark';

interface PageFrameProps {
  /** Beside the mark: what this page belongs to. */
  readonly title: ReactNode;
  /** Where the mark leads. */
  readonly home: string;
  readonly places: readonly { readonly to: string; readonly text: string }[];
  /** At the masthead's end. */
  readonly person: ReactNode;
  /** Notes beside the page; under it where the window is narrow. */
  readonly margin?: ReactNode;
  readonly children: ReactNode;
}

/** A page of the team: masthead, the page itself, its margin. */
export function PageFrame({ title, home, places, person, margin, children }: PageFrameProps) {
  return (
    <div className="flex min-h-dvh flex-col">
      <SkipLink />
      <header className="flex flex-wrap items-center gap-x-4 border-b border-rule px-4 sm:px-6">
        <Link to={home} aria-label="Stillpoint, the team's sheets" className="flex h-13 items-center">
          <Mark />
        </Link>
        <div className="min-w-0 flex-1 sm:flex-none">{title}</div>
        <nav
          aria-label="Pages"
          className="order-last -mx-4 flex w-screen gap-6 border-t border-rule px-4 sm:order-none sm:mx-0 sm:ml-6 sm:w-auto sm:flex-1 sm:border-0 sm:px-0"
        >
          {places.map((place) => (
            <NavLink
              key={place.to}
              to={place.to}
              end
              className="flex h-10 items-center border-b-2 border-transparent text-faint hover:text-ink aria-[current=page]:border-ink aria-[current=page]:text-ink sm:h-13"
            >
              {place.text}
            </NavLink>
          ))}
        </nav>
        {person}
      </header>
      <div className="grid flex-1 grid-cols-1 grid-rows-[auto_1fr] lg:grid-rows-1 lg:grid-cols-[minmax(0,1fr)_20rem]">
        <main id="main" tabIndex={-1} className="min-w-0 px-4 pt-6 pb-12 outline-none sm:px-6">
          {children}
        </main>
        {margin !== undefined && (
          <aside
            aria-label="Margin"
            className="border-t-4 border-double border-rule px-4 pt-6 pb-12 sm:px-6 lg:border-t-0 lg:border-l-4"
          >
            {margin}
          </aside>
        )}
      </div>
    </div>
  );
}

export function SkipLink() {
  return (
    <a
      href="#main"
      className="absolute top-2 left-2 z-50 -translate-y-16 border border-ink bg-sheet px-3.5 py-1.5 focus:translate-y-0"
    >
      Skip to the page
    </a>
  );
}
