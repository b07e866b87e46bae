package org.flexbound.frame;

/**
 * The numbers of a cross-section that a member's stiffness and mass are made of. Iy, Iz, Ay and Az
 * are about (along) the principal axes of the section.
 *
 * @param area A, m²
 * @param iy second moment of area about the principal axis y, m⁴
 * @param iz second moment of area about the principal axis z, m⁴
 * @param j Saint-Venant torsion constant, m⁴
 * @param ay shear area along y, m²; infinite for no shear deformation
 * @param az shear area along z, m²; infinite for no shear deformation
 * @param principalAngle from the member's y to the principal y, about the member's x, rad
 * @param shearCentreY from the centroid to the shear centre along the member's y, m
 * @param shearCentreZ from the centroid to the shear centre along the member's z, m
 */
public record SectionProperties(
    double area,
    double iy,
    double iz,
    double j,
    double ay,
    double az,
    double principalAngle,
    double shearCentreY,
    double shearCentreZ) {
  /**
   * A section whose principal axes are the member's and whose shear centre is its centroid.
   *
   * @param area A
   * @param iy Iy
   * @param iz Iz
   * @param j J
   * @param ay shear area along y
   * @param az shear area along z
   * @return the properties
   */
  public static SectionProperties symmetric(
      double area, double iy, double iz, double j, double ay, double az) {
    return new SectionProperties(area, iy, iz, j, ay, az, 0, 0, 0);
  }

  /**
   * Whether twist and bending go together since the shear centre is not the centroid.
   *
   * @return true where they do
   */
  public boolean hasOffsetShearCentre() {
    return shearCentreY != 0 || shearCentreZ != 0;
  }

  /**
   * A stiffness of a member of this section.
   *
   * @param rigidity which
   * @param youngsModulus E, Pa
   * @param shearModulus G, Pa
   * @return N or N·m²; infinite where there is no shear deformation
   */
  public double stiffness(Rigidity rigidity, double youngsModulus, double shearModulus) {
    return switch (rigidity) {
      case EA -> youngsModulus * area;
      case EI_Y -> youngsModulus * iy;
      case EI_Z -> youngsModulus * iz;
      case GJ -> shearModulus * j;
      case GA_Y -> shearModulus * ay;
      case GA_Z -> shearModulus * az;
    };
  }
}
