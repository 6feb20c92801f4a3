import { Button, Menu, MenuItem, MenuTrigger, Popover, Separator } from 'react-aria-components';
import { MenuFace, type MenuProps } from './lazy-menu.tsx';

/** A menu button; loaded when it is first pressed. */
export function OpenMenu({ label, className, face, chevron, entries, defaultOpen }: MenuProps & { readonly defaultOpen: boolean }) {
  return (
    <MenuTrigger defaultOpen={defaultOpen}>
      <Button className={className} aria-label={face ? label : undefined}>
        <MenuFace face={face} label={label} chevron={chevron} />
      </Button>
      <Popover placement="bottom end" offset={4}>
        <Menu className="menu" aria-label={label}>
          {entries.map((entry) =>
            'rule' in entry ? (
              <Separator key={entry.rule} className="menu-rule" />
            ) : (
              <MenuItem
                key={entry.id}
                id={entry.id}
                className="menu-item"
                isDisabled={entry.disabled}
                onAction={entry.onAction}
                textValue={entry.label}
              >
                <span>{entry.label}</span>
                {entry.hint && <span className="menu-key">{entry.hint}</span>}
              </MenuItem>
            ),
          )}
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}
