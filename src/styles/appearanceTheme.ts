import { theme } from 'ant-design-vue';
import type { ThemeConfig } from 'ant-design-vue/es/config-provider/context';
import { palettes, type Appearance, type Palette } from './appearance';

const FONT_FAMILY = "'Fira Sans', system-ui, sans-serif";

function tokensOf(p: Palette): NonNullable<ThemeConfig['token']> {
  return {
    fontFamily: FONT_FAMILY,
    fontSize: 16,
    controlHeight: 40,
    borderRadius: 2,
    borderRadiusSM: 2,
    borderRadiusLG: 2,
    wireframe: false,
    motionDurationFast: '0s',
    motionDurationMid: '0s',
    motionDurationSlow: '0s',
    colorPrimary: p.accent,
    colorPrimaryHover: p.accent,
    colorPrimaryActive: p.accent,
    colorPrimaryBorder: p.accent,
    colorPrimaryBg: p.sunken,
    colorLink: p.accent,
    colorLinkHover: p.ink,
    colorInfo: p.accent,
    colorSuccess: p.accent,
    colorWarning: p.accent,
    colorError: p.fault,
    colorErrorHover: p.fault,
    colorErrorBorderHover: p.fault,
    colorTextBase: p.ink,
    colorBgBase: p.panel,
    colorText: p.ink,
    colorTextHeading: p.ink,
    colorTextSecondary: p.quiet,
    colorTextTertiary: p.quiet,
    colorTextDescription: p.quiet,
    colorTextPlaceholder: p.quiet,
    colorTextDisabled: p.quiet,
    colorTextLightSolid: p.onAccent,
    colorIcon: p.quiet,
    colorIconHover: p.ink,
    colorBgLayout: p.page,
    colorBgContainer: p.panel,
    colorBgElevated: p.panel,
    colorBgContainerDisabled: p.sunken,
    colorBorder: p.edge,
    colorBorderSecondary: p.line,
    colorSplit: p.line,
    controlItemBgActive: p.sunken,
    controlItemBgActiveHover: p.sunken,
    controlItemBgHover: p.sunken,
    controlOutline: 'transparent',
  };
}

/** The component library's theme in an appearance; the same palette as the CSS variables. */
export function appearanceTheme(appearance: Appearance): ThemeConfig {
  const palette = palettes[appearance];
  return {
    algorithm: palette.scheme === 'dark' ? theme.darkAlgorithm : theme.defaultAlgorithm,
    token: tokensOf(palette),
    // The dark algorithm dims what it is given; a button has to keep its contrast.
    components: { Button: { colorPrimary: palette.accent, colorError: palette.fault } },
  };
}
