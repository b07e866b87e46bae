package org.flexbound.frame;

/**
 * Area, centroid and second moments of a plane figure put together from rectangles and from the
 * corners between a right angle and a quarter circle. y and z are any axes at first; the second
 * moments are about the centroid.
 */
final class CompositeArea {
  private static final double CORNER_AREA = 1 - Math.PI / 4;

  /** From the right angle to the centroid, along each side, over the radius. */
  private static final double CORNER_PLACE = (10 - 3 * Math.PI) / (12 - 3 * Math.PI);

  /** ∫y² about the right angle over r⁴. */
  private static final double CORNER_SECOND = 1 - 5 * Math.PI / 16;

  /** ∫yz about the right angle over r⁴. */
  private static final double CORNER_PRODUCT = 19.0 / 24 - Math.PI / 4;

  private double area;
  private double firstY;
  private double firstZ;
  private double yy;
  private double zz;
  private double yz;

  /** A rectangle by its centre and its sizes along y and z; sign −1 takes it out. */
  void rectangle(double y, double z, double sizeY, double sizeZ, int sign) {
    double a = sign * sizeY * sizeZ;
    add(a, y, z, a * sizeY * sizeY / 12, a * sizeZ * sizeZ / 12, 0);
  }

  /**
   * The figure between a right angle at (y, z), whose sides go towards (directionY, directionZ), and
   * the quarter circle that touches both.
   */
  void corner(
      double y, double z, int directionY, int directionZ, double radius, int sign) {
    double r2 = radius * radius;
    double a = CORNER_AREA * r2;
    double place = CORNER_PLACE * radius;
    double second = CORNER_SECOND * r2 * r2 - a * place * place;
    double product = (CORNER_PRODUCT * r2 * r2 - a * place * place) * directionY * directionZ;
    add(
        sign * a,
        y + directionY * place,
        z + directionZ * place,
        sign * second,
        sign * second,
        sign * product);
  }

  private void add(double a, double y, double z, double ownYy, double ownZz, double ownYz) {
    area += a;
    firstY += a * y;
    firstZ += a * z;
    yy += ownYy + a * y * y;
    zz += ownZz + a * z * z;
    yz += ownYz + a * y * z;
  }

  double area() {
    return area;
  }

  double centroidY() {
    return firstY / area;
  }

  double centroidZ() {
    return firstZ / area;
  }

  /** ∫z² about the centroid. */
  double iy() {
    return zz - firstZ * firstZ / area;
  }

  /** ∫y² about the centroid. */
  double iz() {
    return yy - firstY * firstY / area;
  }

  /** ∫yz about the centroid. */
  double iyz() {
    return yz - firstY * firstZ / area;
  }
}
