import { Check, Copy } from 'lucide-react';
import { useEffect, useState, type JSX } from 'react';

import { Button, IconButton, type ButtonVariant } from '#client/components/button.tsx';
import { useToast } from '#client/components/toast.tsx';
import { copyText } from '#client/lib/copy-text.ts';

interface CopyButtonProps {
  text: string;
  /** What is copied: `Copy the link`. */
  label: string;
  /** With its label beside the sign. */
  isNamed?: boolean;
  variant?: ButtonVariant;
  className?: string;
}

const shownMs = 1_600;

/** Copies a text; the sign turns to a tick for a moment. */
export function CopyButton({
  text,
  label,
  isNamed = false,
  variant = 'plain',
  className,
}: CopyButtonProps): JSX.Element {
  const show = useToast();
  const [isCopied, setCopied] = useState(false);
  useEffect(() => {
    if (!isCopied) {
      return undefined;
    }
    const timer = setTimeout(() => setCopied(false), shownMs);
    return () => clearTimeout(timer);
  }, [isCopied]);

  const copy = (): void => {
    copyText(text).then(
      () => setCopied(true),
      () => show({ message: 'The browser did not allow copying.', tone: 'failure' }),
    );
  };
  const sign = isCopied ? (
    <Check aria-hidden className="size-4" />
  ) : (
    <Copy aria-hidden className="size-4" />
  );
  return isNamed ? (
    <Button variant={variant} onClick={copy} className={className}>
      {sign}
      <span aria-live="polite">{isCopied ? 'Copied' : label}</span>
    </Button>
  ) : (
    <IconButton
      label={isCopied ? 'Copied' : label}
      icon={sign}
      onClick={copy}
      className={className}
    />
  );
}
