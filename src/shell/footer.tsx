// The foot of every page: where to go, what can hurt, and what the product does not decide.
import { Link } from 'react-router-dom';
import { paths } from '../paths';
import { ThemeSwitch } from '../ui/theme-switch';
import type { MenuLink } from './account';

const COLUMNS: readonly { readonly title: string; readonly links: readonly MenuLink[] }[] = [
  {
    title: 'Builders',
    links: [
      { label: 'Find a core', to: paths.results.to() },
      { label: 'Check a code', to: paths.codeReader.to() },
      { label: 'Code book', to: paths.families.to() },
    ],
  },
  {
    title: 'Yards',
    links: [
      { label: 'List a unit', to: paths.newListing.to() },
      { label: 'Receive a core', to: paths.receiving.to() },
    ],
  },
];

function Cautions() {
  return (
    <div className="foot-cautions mute">
      <p>
        <b className="b">Units are heavy and full of fluid.</b> Use a hoist or a transmission jack, stands and
        a second pair of hands. Keep the converter from sliding out, drain and plug before moving, let hot
        parts cool, and keep fluid off the ground. The service manual, local codes and licensed practice come
        before anything written here.
      </p>
      <p>
        <b className="b">Not legal advice.</b> Records of used parts, salvage-vehicle reporting, tax, and
        holding other people&rsquo;s money follow the law where you are. Every unit here is used unless its
        listing says it was rebuilt.
      </p>
    </div>
  );
}

export function Footer() {
  return (
    <footer className="foot">
      <div className="page">
        <div className="grid content-start gap-14">
          <div>
            <h2>Spragyard</h2>
            <p className="sm mute max-w-lede">
              Named for the one-way clutch in an automatic: it lets the shaft turn one way and holds it the
              other.
            </p>
          </div>
        </div>
        {COLUMNS.map((column) => (
          <nav key={column.title} aria-label={column.title}>
            <h2>{column.title}</h2>
            <ul>
              {column.links.map((link) => (
                <li key={link.to}>
                  <Link to={link.to}>{link.label}</Link>
                </li>
              ))}
            </ul>
          </nav>
        ))}
        <div className="grid content-start gap-6">
          <h2>Colours</h2>
          <ThemeSwitch />
        </div>
        <Cautions />
      </div>
    </footer>
  );
}
