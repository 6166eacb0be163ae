/**
 * <b>Purpose.</b> Writes the looks of layers for other programs: QML for QGIS, SLD for map servers.
 *
 * <p><b>May depend on.</b> {@code layer}, {@code time}; no library.
 *
 * <p><b>Conventions.</b> Texts are whole UTF-8 documents. Every name, label and column passes through
 * {@link org.wintersill.io.style.XmlText}, so that no text from outside can break out of its place. Numbers are
 * written with a point and without exponent in every locale. QGIS reads no SLD for rasters and looks for a {@code .qml} of
 * the same base name; SLD is for servers.
 *
 * <p>Sources: OGC 02-070 Styled Layer Descriptor 1.0.0 and OGC 02-059 Filter Encoding 1.0.0; the attribute {@code type} of
 * {@code ColorMap} is GeoServer's addition, which QGIS writes too. The elements of QML are those that QGIS 3.22 reads.
 */
package org.wintersill.io.style;
