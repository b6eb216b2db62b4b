import type { ThemeConfig } from 'antd';
import { monoFamily, sansFamily, themes, type ThemeName } from './tokens';

/**
 * Maps a theme's tokens onto antd. The default algorithm serves all themes: every grey is set outright, none is derived.
 * antd's style tags need the page's nonce: pass `csp={{ nonce }}` to its ConfigProvider (see `readCspNonce`).
 */
export function antdTheme(name: ThemeName): ThemeConfig {
  const t = themes[name];
  const floating = `0 0 0 1px ${t.frame}, ${t.shadow}`;
  return {
    token: {
      colorPrimary: t.primer,
      colorInfo: t.water,
      colorSuccess: t.green,
      colorWarning: t.brass,
      colorError: t.red,
      colorLink: t.primer,
      colorTextBase: t.ink,
      colorText: t.ink,
      colorTextSecondary: t.ink2,
      colorTextTertiary: t.ink3,
      colorTextQuaternary: t.ink3,
      colorTextPlaceholder: t.ink3,
      colorTextDisabled: t.ink3,
      colorTextLightSolid: t.onPrimer,
      colorBgBase: t.paper,
      colorBgLayout: t.ground,
      colorBgContainer: t.paper,
      colorBgElevated: t.paper,
      colorBgContainerDisabled: t.paper2,
      colorFillAlter: t.paper2,
      colorBorder: t.rule2,
      colorBorderSecondary: t.rule,
      colorSplit: t.rule,
      controlItemBgActive: t.primerWash,
      controlItemBgHover: t.paper2,
      borderRadius: 0,
      borderRadiusLG: 0,
      borderRadiusSM: 0,
      borderRadiusXS: 0,
      fontFamily: sansFamily,
      fontFamilyCode: monoFamily,
      fontSize: 14,
      fontSizeSM: 12,
      controlHeight: 36,
      controlHeightSM: 30,
      controlHeightLG: 48,
      motionDurationFast: '.1s',
      motionDurationMid: '.16s',
      motionDurationSlow: '.24s',
      boxShadow: floating,
      boxShadowSecondary: floating,
    },
    components: {
      Button: { fontWeight: 600, primaryShadow: 'none', defaultShadow: 'none', dangerShadow: 'none' },
      Table: {
        headerBg: t.paper,
        headerColor: t.ink3,
        borderColor: t.rule,
        rowHoverBg: t.paper2,
        rowSelectedBg: t.primerWash,
        headerBorderRadius: 0,
        cellPaddingBlockSM: 4,
        cellPaddingInline: 8,
      },
      Layout: { headerBg: t.paper, bodyBg: t.ground, headerHeight: 48 },
      // The chosen tab is dimensioned by our own line (class `dimmed`).
      Tabs: { inkBarColor: 'transparent' },
      Form: { labelColor: t.ink3, verticalLabelPadding: '0 0 4px' },
      Segmented: { itemSelectedBg: t.primerWash, itemSelectedColor: t.primerStrong, trackBg: t.paper },
    },
  };
}

/** The nonce the server put into the page's head, for antd's `csp`; empty when the page is served without a policy. */
export function readCspNonce(): string {
  const nonce = document.querySelector<HTMLMetaElement>('meta[name="csp-nonce"]')?.content ?? '';
  return nonce.startsWith('__') ? '' : nonce;
}
