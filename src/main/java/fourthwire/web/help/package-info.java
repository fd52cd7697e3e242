/** How the program is used, what it takes and by what it judges. Door: the controller. */
@org.jspecify.annotations.NullMarked
package fourthwire.web.help;
