/** What the key of a material looks like: words of small letters and digits with hyphens between. */
export const KEY_PATTERN = '^[a-z0-9]+(-[a-z0-9]+)*$';
