import type { ReactNode } from 'react';
import { Tab, TabList, TabPanel, Tabs as AriaTabs } from 'react-aria-components';
import { NavLink } from 'react-router-dom';

const tabLook =
  'inline-flex min-h-12 cursor-pointer items-center gap-2 px-4 font-semibold whitespace-nowrap text-ink-2 no-underline outline-offset-[-3px] hover:text-film-5';
const chosenLook = 'text-film-5 bg-paper-0 shadow-[inset_0_-4px_0_var(--color-film-4)]';

/** Panels that share a place on one screen. For pages with addresses of their own use `TabLinks`. */
export function Tabs({
  label,
  tabs,
  chosenId,
  onChoose,
}: {
  label: string;
  tabs: readonly { readonly id: string; readonly label: string; readonly panel: ReactNode }[];
  chosenId?: string;
  onChoose?: (id: string) => void;
}) {
  return (
    <AriaTabs
      {...(chosenId === undefined ? {} : { selectedKey: chosenId })}
      onSelectionChange={(key) => {
        onChoose?.(String(key));
      }}
    >
      <TabList aria-label={label} className="flex overflow-x-auto border-b border-paper-3">
        {tabs.map((tab) => (
          <Tab key={tab.id} id={tab.id} className={({ isSelected }) => `${tabLook} ${isSelected ? chosenLook : ''}`}>
            {tab.label}
          </Tab>
        ))}
      </TabList>
      {tabs.map((tab) => (
        <TabPanel key={tab.id} id={tab.id} className="pt-4 outline-offset-4">
          {tab.panel}
        </TabPanel>
      ))}
    </AriaTabs>
  );
}

/** Sibling pages, each with its address. */
export function TabLinks({
  label,
  links,
}: {
  label: string;
  links: readonly { readonly to: string; readonly label: string; readonly count?: number }[];
}) {
  return (
    <nav aria-label={label}>
      <ul className="flex overflow-x-auto border-b border-paper-3">
        {links.map((link) => (
          <li key={link.to}>
            <NavLink to={link.to} className={({ isActive }) => `${tabLook} ${isActive ? chosenLook : ''}`}>
              {link.label}
              {link.count !== undefined && <span className="font-normal text-ink-2 tabular-nums">{link.count}</span>}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
