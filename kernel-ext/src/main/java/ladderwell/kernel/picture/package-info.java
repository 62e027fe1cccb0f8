/**
 * Figures and animations in our own look, as pieces of HTML that need no network.
 *
 * <p>Every picture is a still image that any page shows, and the data of a drawing; where scripts run, the player
 * ({@code player.js}, which travels with the plotting library in {@link ladderwell.kernel.picture.PageLibrary}) draws it
 * and takes the still away. Colours live in {@code picture.css} alone, a light and a dark set; the player chooses by the
 * background that the page really has.
 *
 * <p>Reading order: {@link ladderwell.kernel.picture.PageLibrary} (once per page), {@link
 * ladderwell.kernel.picture.Motion} (what an animation shows, in the units it shows) and {@link
 * ladderwell.kernel.picture.MotionPicture}, {@link ladderwell.kernel.picture.LevelDiagram} and {@link
 * ladderwell.kernel.picture.LevelPicture}, {@link ladderwell.kernel.picture.FigurePicture} (a Tablesaw figure of the
 * user's own).
 */
@NullMarked
package ladderwell.kernel.picture;

import org.jspecify.annotations.NullMarked;
