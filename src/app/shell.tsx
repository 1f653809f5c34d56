import type { ReactNode } from 'react';
import { Link, NavLink } from 'react-router-dom';
import { ProductMark } from './product-mark.tsx';
import { ThemeSwitch } from './theme-switch.tsx';

export interface NavigationItem {
  to: string;
  label: string;
  /** Things waiting for this person there. */
  waiting?: number;
  /** Current on this address alone and not on those beneath it. */
  end?: boolean;
}

export interface ShellProps {
  /** Where the product mark leads. */
  homeTo: string;
  /** Site name or switch. */
  site?: ReactNode;
  navigation?: readonly NavigationItem[];
  /** Search, help: left of the theme switch. */
  tools?: ReactNode;
  /** Who is signed in, and signing out. */
  account?: ReactNode;
  children: ReactNode;
}

/** The frame of every page: one ruled head, the page beneath it on the full width. */
export function Shell({ homeTo, site, navigation = [], tools, account, children }: ShellProps) {
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#main"
        className="absolute -top-20 left-2 z-50 border border-ink bg-ink px-3 py-2 text-paper focus:top-2"
      >
        Skip to the page
      </a>
      <header className="border-b border-ink bg-sheet">
        <div className="flex flex-wrap items-stretch">
          <Link
            to={homeTo}
            aria-label="Fretline, start page"
            className="flex items-center px-4 py-2 hover:bg-well"
          >
            <ProductMark />
          </Link>
          {site && (
            <div className="flex items-center border-l border-hairline px-3 text-sm">{site}</div>
          )}
          {navigation.length > 0 && (
            <nav
              aria-label="Parts of Fretline"
              className="order-last w-full overflow-x-auto border-t border-hairline xl:order-none xl:w-auto xl:border-t-0 xl:border-l"
            >
              <ul className="flex h-full">
                {navigation.map((item) => (
                  <li key={item.to} className="flex">
                    <NavigationLink item={item} />
                  </li>
                ))}
              </ul>
            </nav>
          )}
          <div className="ml-auto flex items-center gap-1 px-2 py-1">
            {tools}
            <ThemeSwitch />
            {account}
          </div>
        </div>
      </header>
      <main id="main" tabIndex={-1} className="grow px-4 py-5 outline-none phone:px-6">
        {children}
      </main>
    </div>
  );
}

function NavigationLink({ item }: { item: NavigationItem }) {
  return (
    <NavLink
      to={item.to}
      end={item.end ?? false}
      className={({ isActive }) =>
        `flex min-h-10 items-center gap-2 border-b-3 px-3 text-sm whitespace-nowrap hover:bg-well ${isActive ? 'border-ink font-semibold' : 'border-transparent'}`
      }
    >
      {item.label}
      {item.waiting !== undefined && item.waiting > 0 && (
        <span className="figures border border-ink px-1 text-xs">
          {item.waiting}
          <span className="sr-only"> waiting</span>
        </span>
      )}
    </NavLink>
  );
}
