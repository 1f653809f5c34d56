/**
 * Paper, ink and hairlines for mail programs: inline styles only, since many drop style sheets, and
 * nothing loaded from elsewhere. The tones are those of the product's light theme.
 */
const sans = "Archivo,'Helvetica Neue',Arial,sans-serif";
const figures = "ui-monospace,Menlo,Consolas,'DejaVu Sans Mono',monospace";

export const mailStyle = {
  page: `margin:0;padding:24px 12px;background:#f4efe2;color:#1b2128;font-family:${sans};font-size:15px;line-height:22px`,
  sheet: 'max-width:600px;margin:0 auto;background:#fbf8f0;border:1px solid #d3cab4',
  mark: 'margin:0;padding:12px 20px;border-bottom:1px solid #1b2128;font-weight:600;font-size:17px;letter-spacing:0.02em',
  content: 'padding:16px 20px',
  heading: 'margin:20px 0 6px;font-size:15px;line-height:22px;font-weight:600',
  text: 'margin:0 0 12px',
  list: 'margin:0 0 12px;padding:0 0 0 20px',
  item: 'margin:0 0 4px',
  facts: 'margin:0 0 14px;border-top:1px solid #d3cab4;width:100%',
  factName:
    'padding:4px 12px 4px 0;border-bottom:1px solid #d3cab4;font-weight:400;color:#454b52;width:36%;vertical-align:top',
  factValue: `padding:4px 0;border-bottom:1px solid #d3cab4;font-family:${figures};font-size:14px`,
  link: 'color:#1b2128;text-decoration:underline',
  button:
    'display:inline-block;margin:4px 0;padding:9px 16px;background:#1b2128;color:#f4efe2;text-decoration:none;font-weight:600',
  foot: 'margin:0;padding:12px 20px;border-top:1px solid #d3cab4;font-size:12px;line-height:18px;color:#5f625f',
} as const;
