/** A small button that shows only an icon; its name is read out and shown on pointing. */

import { Icon, type IconName } from './Icon';

interface Props {
  icon: IconName;
  name: string;
  onClick: () => void;
  disabled?: boolean;
  pressed?: boolean;
}

export function IconButton({ icon, name, onClick, disabled, pressed }: Props) {
  return (
    <button
      type="button"
      class="icon-button"
      aria-label={name}
      title={name}
      aria-pressed={pressed}
      disabled={disabled}
      onClick={onClick}
    >
      <Icon name={icon} />
    </button>
  );
}
