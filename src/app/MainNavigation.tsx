import { NavLink, useLocation } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';

interface Way {
  readonly to: string;
  readonly label: string;
  /** Pages below this address count as being here; the address itself when left out. */
  readonly below?: string;
  /** On a phone beside the name of the site, so that the other ways have their rows to themselves. */
  readonly aloft?: boolean;
}

/** Where one can go; the ways shown are those the server says this reader has. */
export function MainNavigation() {
  const { me, abilities, known } = useSession();
  const { pathname, search } = useLocation();
  const ways: Way[] = [
    { to: paths.find(), label: 'Find' },
    { to: paths.whatHelped, label: 'What helped' },
    { to: paths.figures, label: 'Figures' },
    ...(abilities.write
      ? [
          { to: paths.notebook, label: 'Notebook' },
          { to: paths.kilns, label: 'Kilns' },
          { to: paths.newNote(), label: 'Write' },
        ]
      : []),
    ...(abilities.moderate ? [{ to: paths.desk, label: 'Desk' }] : []),
    ...(abilities.administer ? [{ to: paths.adminMembers, label: 'Admin', below: '/admin/' }] : []),
  ];
  const here = pathname === '/sign-in' ? '' : `${pathname}${search}`;
  return (
    <nav aria-label="Main" className={`ml-auto ${me ? 'max-sm:-mt-2 max-sm:w-full' : ''}`}>
      <ul
        className={`flex flex-wrap items-center gap-x-5 text-small ${me ? 'justify-start sm:justify-end' : 'justify-end'}`}
      >
        {ways.map((way) => (
          <Item key={way.label} {...way} />
        ))}
        {known &&
          (me ? (
            <Item to={paths.settings} label={me.name} aloft />
          ) : (
            <Item to={paths.signIn(here === '/' ? '' : here)} label="Sign in" />
          ))}
      </ul>
    </nav>
  );
}

function Item({ to, label, below, aloft = false }: Way) {
  const { pathname } = useLocation();
  const isBelow = below !== undefined && pathname.startsWith(below);
  return (
    <li className={aloft ? 'max-sm:absolute max-sm:top-3 max-sm:right-0 max-sm:max-w-[60%]' : ''}>
      <NavLink
        to={to}
        className={({ isActive }) =>
          `inline-flex min-h-11 max-w-full items-center border-b-2 no-underline ${
            isActive || isBelow
              ? 'border-verdigris font-[600] text-verdigris'
              : 'border-transparent text-soot-2 hover:text-soot'
          }`
        }
      >
        <span className="truncate">{label}</span>
      </NavLink>
    </li>
  );
}
