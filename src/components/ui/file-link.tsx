import { useRef, useState, type MouseEvent, type ReactNode } from 'react';
import { sentenceOf } from '../../lib/errors';
import { openFile, saveFile } from '../../lib/files';
import { Icon, type IconName } from '../icon';
import { buttonLook, type ButtonKind, type ButtonSize } from './button-look';

type FileLinkProps = {
  /** Address of the file at the server. */
  to: string;
  /** open: in a tab of its own, such as a sheet to print. save: onto this device. */
  how: 'open' | 'save';
  children: ReactNode;
  kind?: ButtonKind;
  size?: ButtonSize;
  icon?: IconName;
  className?: string;
};

/** Leads to a file of the server. It is fetched and looked at first: a refusal is said here, never saved or opened. */
export function FileLink({ to, how, children, kind = 'film', size = 'normal', icon, className = '' }: FileLinkProps) {
  const isFetching = useRef(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [isWaiting, setIsWaiting] = useState(false);

  async function fetchIt() {
    if (isFetching.current) return;
    isFetching.current = true;
    setIsWaiting(true);
    setRefusal(null);
    try {
      await (how === 'open' ? openFile(to) : saveFile(to));
    } catch (error) {
      setRefusal(sentenceOf(error));
    }
    isFetching.current = false;
    setIsWaiting(false);
  }

  function press(event: MouseEvent) {
    // With a key held, it is the browser's own way to a new tab or window.
    if (event.ctrlKey || event.metaKey || event.shiftKey || event.altKey) return;
    event.preventDefault();
    void fetchIt();
  }

  return (
    <span className={`inline-grid justify-items-start gap-1.5 ${className}`}>
      <a
        href={to}
        {...(how === 'open' ? { target: '_blank', rel: 'noopener' } : { download: '' })}
        aria-busy={isWaiting}
        className={buttonLook(kind, size)}
        onClick={press}
      >
        {icon && <Icon name={isWaiting ? 'wait' : icon} size={size === 'small' ? 18 : 20} />}
        {children}
      </a>
      {refusal !== null && (
        <span role="alert" className="max-w-96 text-row font-semibold text-madder-3">
          {refusal}
        </span>
      )}
    </span>
  );
}
