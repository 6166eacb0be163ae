/** placeholder */
package org.wintersill.hardiness;
