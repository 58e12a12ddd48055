import type { HTMLAttributes, ReactNode } from 'react';
import { Icon, type IconName } from './icon.tsx';

interface Props extends HTMLAttributes<HTMLDivElement> {
  icon?: IconName;
  /** "Drop the PDF or a photo here", or the name of the file that was dropped. */
  title: string;
  /** "checked here, not sent": only where that is how it works. */
  sub?: string;
  /** A file is held over it. */
  over?: boolean;
  /** "Choose a file", and the input. */
  children?: ReactNode;
}

/** A place to drop a file on; choosing one is always offered beside it. */
export function DropArea({
  icon = 'file',
  title,
  sub,
  over,
  children,
  className = '',
  ...rest
}: Props) {
  return (
    <div className={`file-drop ${over ? 'file-drop-over' : ''} ${className}`} {...rest}>
      <Icon name={icon} size={26} />
      <span className="min-w-0 [overflow-wrap:anywhere]">
        <b className="block">{title}</b>
        {sub}
      </span>
      {children}
    </div>
  );
}
