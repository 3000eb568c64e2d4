import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router';
import { Menu, MenuHeading, MenuItem, MenuRule } from '#client/ui/menu.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { buttonClass } from '#client/ui/button.tsx';
import { type Me } from '#server/contracts/people.ts';
import { signOut } from './session.tsx';
import { THEMES } from './theme.ts';
import { useTheme } from './use-theme.ts';

export function PersonMenu({ me, onShowKeys }: { me: Me; onShowKeys: () => void }) {
  const navigate = useNavigate();
  const client = useQueryClient();
  const { theme, choose } = useTheme(me);
  const [failure, setFailure] = useState<string | null>(null);

  const leave = async () => {
    try {
      await signOut();
    } catch (error) {
      setFailure(`You are still signed in. ${sentenceOf(error)}`);
      return;
    }
    await navigate('/sign-in');
    client.clear();
  };
  return (
    <>
      {failure !== null && (
        <span role="alert" className="truncate text-brick">
          {failure}
        </span>
      )}
      <Menu trigger={<span className="max-w-40 truncate">{me.name}</span>} className={buttonClass('plain')}>
        <MenuHeading>
          {me.role}, {me.workshop.name}
        </MenuHeading>
        <MenuItem onSelect={() => void navigate('/account')}>Account</MenuItem>
        <MenuItem onSelect={onShowKeys}>Keys</MenuItem>
        <MenuRule />
        <MenuHeading>Theme</MenuHeading>
        {THEMES.map(({ value, label }) => (
          <MenuItem
            key={value}
            chosen={theme === value}
            onSelect={() => {
              choose(value);
            }}
          >
            {label}
          </MenuItem>
        ))}
        <MenuRule />
        <MenuItem onSelect={() => void leave()}>Sign out</MenuItem>
      </Menu>
    </>
  );
}
