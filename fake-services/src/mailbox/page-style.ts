/** Tokens, frame and ruled cells of the product's light theme, and the layout of the three panels. */
export const pageStyle = `
@font-face{font-family:"IBM Plex Sans";font-weight:400;src:local("IBM Plex Sans"),url(/fonts/ibm-plex-sans-400.woff2) format("woff2")}
@font-face{font-family:"IBM Plex Sans";font-weight:600;src:local("IBM Plex Sans SemiBold"),url(/fonts/ibm-plex-sans-600.woff2) format("woff2")}
@font-face{font-family:"IBM Plex Mono";font-weight:400;src:local("IBM Plex Mono"),url(/fonts/ibm-plex-mono-400.woff2) format("woff2")}
@font-face{font-family:"IBM Plex Mono";font-weight:600;src:local("IBM Plex Mono SemiBold"),url(/fonts/ibm-plex-mono-600.woff2) format("woff2")}
:root{
  --ground:#ECEEEB;--paper:#FDFDFB;--paper2:#F4F5F2;--rule:#D2D5CF;--rule2:#82877F;
  --ink:#1C1A22;--ink2:#484651;--ink3:#62606B;--primer:#5B2C90;--primerWash:#F0E9F7;--red:#A81C1C;
  --sans:"IBM Plex Sans",system-ui,sans-serif;--mono:"IBM Plex Mono",ui-monospace,monospace
}
*{box-sizing:border-box}
body{margin:0;background:var(--ground);color:var(--ink);font:400 14px/20px var(--sans)}
h1,h2,h3,p,ul,dl,dd,pre{margin:0;padding:0}
ul{list-style:none}
h1,h2,h3,b{font-weight:600}
a{color:var(--primer);text-underline-offset:3px}
:focus-visible{outline:3px solid var(--primer);outline-offset:2px}
.n,pre{font-family:var(--mono);font-variant-numeric:tabular-nums;letter-spacing:-.01em}
.nw{white-space:nowrap}
.grow{flex:1;min-width:0;overflow-wrap:anywhere}
.lab,dt,th{display:block;font-size:12px;line-height:16px;font-weight:400;color:var(--ink3);text-align:left}
.sheet{margin:10px;border:1px solid var(--ink);background:var(--paper);min-height:calc(100vh - 20px);display:flex;flex-direction:column}
.top{display:flex;height:48px;border-bottom:1px solid var(--rule)}
.brand{display:flex;align-items:center;gap:9px;padding:0 18px 0 14px;border-right:1px solid var(--rule);color:inherit;text-decoration:none;font-weight:600;font-size:17px}
.hd{display:flex;min-height:58px;border-bottom:1px solid var(--ink)}
.hd .c{padding:8px 14px;border-right:1px solid var(--rule)}
.hd .v{display:block;font-size:14px;line-height:22px;font-weight:600}
.hd .t .v{font-size:20px;line-height:26px;letter-spacing:-.01em}
.hd .x{border:0;margin-left:auto;display:flex;align-items:center}
.bad{color:var(--red)}
.act{display:inline-flex;align-items:center;min-height:36px;padding:0 14px;border:1px solid var(--rule2);border-bottom:3px double var(--ink2);background:var(--paper);color:var(--ink);font-weight:600;text-decoration:none}
.act[hidden]{display:none}
.act:hover{background:var(--paper2)}
.panels{flex:1;display:grid;grid-template-columns:248px 320px minmax(0,1fr)}
.panels>*{border-left:1px solid var(--ink);min-width:0}
.panels>*:first-child{border-left:0}
.panel{padding:10px 14px;border-bottom:1px solid var(--ink)}
.panel h2{font-size:16px;line-height:22px}
.mail .panel{padding:10px 20px}
.mail .panel h2{font-size:20px;line-height:26px;letter-spacing:-.01em;overflow-wrap:anywhere}
.back{display:none}
.row{position:relative;display:flex;gap:10px;padding:8px 14px;border-bottom:1px solid var(--rule);color:inherit;text-decoration:none}
.row:hover{background:var(--paper2)}
.row.on{background:var(--primerWash);box-shadow:inset 0 0 0 2px var(--primer)}
.row:focus-visible{outline-offset:-3px;z-index:1}
.row b{display:block}
.second,.at{display:block;font-size:12px;line-height:16px;color:var(--ink3)}
.at{padding-top:2px}
.day{padding:6px 14px;border-bottom:1px solid var(--rule2);background:var(--paper2);font-size:12px;line-height:16px}
.facts{display:grid;grid-template-columns:repeat(2,minmax(0,1fr));border-bottom:1px solid var(--ink);overflow:hidden}
.facts>div{padding:7px 20px 8px;margin:0 0 -1px;border-bottom:1px solid var(--rule);overflow-wrap:anywhere}
.facts>div:nth-child(even){border-left:1px solid var(--rule)}
.parts{display:grid;grid-template-columns:minmax(0,642px);gap:0 28px;padding:0 20px 24px}
.part{padding-top:18px}
.part h3{font-size:14px;line-height:20px;margin-bottom:8px}
.frame{display:block;width:100%;height:640px;border:1px solid var(--rule2);background:#fff}
pre{padding:14px 16px;border:1px solid var(--rule2);background:#fff;font-size:13px;line-height:20px;white-space:pre-wrap;overflow-wrap:anywhere}
.words{width:100%;border-collapse:collapse;border:1px solid var(--rule2);margin-bottom:8px}
.words th,.words td{padding:6px 12px;border-bottom:1px solid var(--rule);vertical-align:top;overflow-wrap:anywhere}
.words tr:last-child>*{border-bottom:0}
.words th{display:table-cell;width:104px;line-height:20px;border-right:1px solid var(--rule);overflow-wrap:normal}
details summary{padding:6px 0;color:var(--primer);text-decoration:underline;text-underline-offset:3px;cursor:pointer}
.fault{padding:8px 12px;margin-bottom:8px;border:1px solid var(--red);color:var(--red)}
.mail>.fault{margin:14px 20px 0}
.acts{padding-top:4px}
.plain{padding:20px}
.mails>.plain,.mails ul+.plain{padding:14px}
.plain h2{font-size:16px;line-height:22px;margin-bottom:4px}
@media (min-width:1680px){.parts{grid-template-columns:minmax(0,642px) minmax(0,560px)}}
@media (max-width:1199px){
  .panels{grid-template-columns:280px minmax(0,1fr);grid-template-rows:auto 1fr}
  .recipients{grid-area:1/1}
  .panels .mails{grid-area:2/1;border-left:0;border-top:1px solid var(--ink)}
  .mail{grid-area:1/2/3/2}
}
@media (max-width:719px){
  body{font-size:16px;line-height:22px}
  .sheet{margin:0;border:0;min-height:100vh}
  .hd{flex-wrap:wrap}
  .hd .c{flex:1 1 auto;border-bottom:1px solid var(--rule);margin-bottom:-1px}
  .hd .t,.hd .wide,.hd .x{flex-basis:100%;border-right:0}
  .hd .x{padding:0;margin:0}
  .hd .x .act{margin:8px 14px}
  .hd .v{font-size:16px}
  .lab,dt,th{font-size:13px;line-height:17px}
  :is([data-view=mail],[data-view=mails]) .hd{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%)}
  :is([data-view=mail],[data-view=mails]) .hd .x{display:none}
  .panels{display:block}
  .panels>*{border-left:0}
  [data-view=recipients] :is(.mails,.mail),[data-view=mails] :is(.recipients,.mail),[data-view=mail] :is(.recipients,.mails){display:none}
  .panels .mails{border-top:0}
  .row{min-height:48px}
  .row.on:not(:hover){background:none;box-shadow:none}
  .second,.at{font-size:15px;line-height:20px}
  .day{font-size:13px}
  .back{display:flex;align-items:center;min-height:44px;margin:-6px 0 2px;font-weight:600}
  .back::before{content:"";width:8px;height:8px;margin:0 8px 0 3px;border:solid var(--primer);border-width:0 0 2px 2px;transform:rotate(45deg)}
  .panel,.mail .panel{padding:10px 14px}
  .facts{grid-template-columns:minmax(0,1fr)}
  .facts>div{padding:7px 14px 8px}
  .facts>div:nth-child(even){border-left:0}
  .parts{padding:0 14px 24px}
  .part h3{font-size:16px;line-height:22px}
  .words th{width:92px}
  .act{min-height:48px}
}
`;
