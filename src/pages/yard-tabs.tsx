// Between what the yard asks of buyers and who works there.
import { NavLink } from 'react-router-dom';
import { paths } from '../paths';

export function YardTabs() {
  return (
    <nav aria-label="Yard" className="flex gap-18">
      <NavLink className="link py-10" to={paths.terms.to()}>
        Terms
      </NavLink>
      <NavLink className="link py-10" to={paths.team.to()}>
        Team
      </NavLink>
    </nav>
  );
}
