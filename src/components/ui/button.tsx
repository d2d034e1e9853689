import { useEffect, useId, useRef, useState, type ReactNode, type Ref } from 'react';
import { Button as AriaButton, Popover } from 'react-aria-components';
import { Icon, type IconName } from '../icon';
import { useAnnounce } from './announcer';
import { buttonLook, type ButtonKind, type ButtonSize } from './button-look';

export type ButtonProps = {
  children: ReactNode;
  kind?: ButtonKind;
  size?: ButtonSize;
  icon?: IconName;
  iconAfter?: IconName;
  type?: 'button' | 'submit';
  /** Id of the form it sends, where it stands outside of it: at the foot of a dialog. */
  form?: string;
  onPress?: () => void;
  /** Why it cannot be pressed now. The button stays in reach and full in contrast, and says this when pressed. */
  blockedBecause?: string | undefined;
  /** Instead of saying why, lead there: move the focus to the first block. */
  onBlockedPress?: () => void;
  /** What it is doing: shown in place of the words, and further presses are ignored. */
  waitingWords?: string | undefined;
  'aria-label'?: string;
  'aria-pressed'?: boolean;
  'aria-expanded'?: boolean;
  autoFocus?: boolean;
  className?: string;
  ref?: Ref<HTMLButtonElement>;
};

const readingTimeMs = 6_000;

/** The one button. Nobody meets a dead control: what is blocked says why. */
export function Button({
  children,
  kind = 'film',
  size = 'normal',
  icon,
  iconAfter,
  type = 'button',
  onPress,
  blockedBecause,
  onBlockedPress,
  waitingWords,
  className = '',
  ref,
  ...rest
}: ButtonProps) {
  const announce = useAnnounce();
  const whyId = useId();
  const own = useRef<HTMLButtonElement>(null);
  const [isSayingWhy, setIsSayingWhy] = useState(false);
  const isBlocked = blockedBecause !== undefined;
  const isWaiting = waitingWords !== undefined;

  useEffect(() => {
    if (!isSayingWhy) return;
    const timer = window.setTimeout(() => {
      setIsSayingWhy(false);
    }, readingTimeMs);
    return () => {
      window.clearTimeout(timer);
    };
  }, [isSayingWhy]);

  function press() {
    if (isWaiting) return;
    if (!isBlocked) {
      onPress?.();
      return;
    }
    announce(blockedBecause, 'assertive');
    if (onBlockedPress) onBlockedPress();
    else setIsSayingWhy(true);
  }

  return (
    <>
      <AriaButton
        {...rest}
        ref={(element) => {
          own.current = element;
          if (typeof ref === 'function') return ref(element);
          if (ref) ref.current = element;
          return undefined;
        }}
        // A blocked or waiting button must not send its form: the attribute aria-disabled alone stops nothing.
        type={isBlocked || isWaiting ? 'button' : type}
        aria-disabled={isBlocked || isWaiting}
        {...(isBlocked ? { 'aria-describedby': whyId } : {})}
        className={`${buttonLook(isBlocked ? 'held' : kind, size)} ${className}`}
        onPress={press}
      >
        {icon && <Icon name={isWaiting ? 'wait' : icon} size={size === 'small' ? 18 : 20} />}
        {waitingWords ?? children}
        {iconAfter && <Icon name={iconAfter} size={18} />}
      </AriaButton>
      {isBlocked && (
        <span id={whyId} hidden>
          {blockedBecause}
        </span>
      )}
      <Popover
        triggerRef={own}
        isOpen={isSayingWhy && isBlocked}
        onOpenChange={setIsSayingWhy}
        isNonModal
        placement="top"
        className="max-w-80 bg-straw-1 px-4 py-3 text-row text-ink-1 shadow-[inset_0_0_0_2px_var(--color-straw-3)]"
      >
        <p aria-hidden="true">{blockedBecause}</p>
      </Popover>
    </>
  );
}
